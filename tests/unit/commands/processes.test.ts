import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { expect, test } from 'vitest'
import { endProcess, findProcess, isRunning, listArguments } from '../../../app/commands/processes.mjs'

async function startSleeper(code = ''): Promise<ChildProcess> {
  const child = spawn(process.execPath, ['-e', `${code};setInterval(() => {}, 1000);console.log('up')`])
  await once(child.stdout!, 'data')
  return child
}

test('a process that was asked to end has ended when the answer comes', async () => {
  const child = await startSleeper()
  const running = findProcess(child.pid!)!
  expect(isRunning(running)).toBe(true)
  expect(await endProcess(running)).toBe(true)
  expect(isRunning(running)).toBe(false)
})

test('a process that does not end when asked is reported, not killed', async () => {
  const child = await startSleeper("process.on('SIGTERM', () => {})")
  expect(await endProcess(findProcess(child.pid!)!, 0.2)).toBe(false)
  expect(child.exitCode).toBeNull()
  child.kill('SIGKILL')
})

test('another process that got the number of an ended one is not taken for it, and not ended', async () => {
  const child = await startSleeper()
  const earlier = { pid: child.pid!, began: '1' }
  expect(isRunning(earlier)).toBe(false)
  expect(await endProcess(earlier)).toBe(true)
  expect(findProcess(child.pid!)).not.toBeNull()
  child.kill('SIGKILL')
})

test('a process tells its arguments', () => {
  expect(listArguments(process.pid).length).toBeGreaterThan(0)
})
