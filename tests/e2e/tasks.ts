import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'

/** Does a task of tests/e2e/child.mjs and gives its answer; the process goes on for `serve` alone. */
export async function startTask(
  task: string,
  given: object,
): Promise<{ done: unknown; child: ChildProcess; log(): string }> {
  const child = fork('tests/e2e/child.mjs', {
    env: { ...process.env, NODE_ENV: 'production' },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  let output = ''
  const take = (chunk: Buffer) => {
    output = `${output}${chunk}`.slice(-100_000)
  }
  child.stdout?.on('data', take)
  child.stderr?.on('data', take)
  child.send({ task, given })
  const answer = await Promise.race([
    once(child, 'message').then(([message]) => message as { done?: unknown; failed?: string }),
    once(child, 'exit').then(([code]) => ({ done: undefined, failed: `ended with ${code}:\n${output}` })),
  ])
  if (answer.failed !== undefined) throw new Error(`${task}: ${answer.failed}`)
  return { done: answer.done, child, log: () => output }
}

/** Ends a process and waits until it has. */
export async function endTask(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return
  child.kill('SIGTERM')
  await once(child, 'exit')
}
