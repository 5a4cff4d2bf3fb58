import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import type { Database } from '~/db/client.server'
import { type Step, startWorker, type Worker } from '~/record/worker.server'

const db = {} as Database
let worker: Worker | undefined
beforeEach(() => void vi.useFakeTimers())
afterEach(async () => {
  await worker?.stop()
  vi.useRealTimers()
})

function start(run: Step['run'], onError: (error: unknown, step: string) => void = () => {}) {
  worker = startWorker({ db, steps: [{ name: 'step', run }], clock: () => new Date(), onError })
  return worker
}

test('while there is something to do the worker goes on at once, then each second', async () => {
  const counts = [3, 2, 0, 0]
  const run = vi.fn(async () => counts.shift() ?? 0)
  start(run)
  await vi.advanceTimersByTimeAsync(0)
  expect(run).toHaveBeenCalledTimes(3)
  await vi.advanceTimersByTimeAsync(1_000)
  expect(run).toHaveBeenCalledTimes(4)
})

test('waking cuts the pause short', async () => {
  const run = vi.fn(async () => 0)
  start(run)
  await vi.advanceTimersByTimeAsync(10)
  worker!.wake()
  await vi.advanceTimersByTimeAsync(0)
  expect(run).toHaveBeenCalledTimes(2)
})

test('a database that goes away is told once, asked again with growing pauses, and found when it is back', async () => {
  let away = true
  const run = vi.fn(async () => {
    if (away) throw new Error('away')
    return 0
  })
  const onError = vi.fn()
  start(run, onError)
  await vi.advanceTimersByTimeAsync(60_000)
  expect(onError).toHaveBeenCalledTimes(1)
  expect(worker!.lastPass()).toBeNull()
  expect(run.mock.calls.length).toBeGreaterThan(4)
  expect(run.mock.calls.length).toBeLessThan(10)
  away = false
  await vi.advanceTimersByTimeAsync(15_000)
  expect(worker!.lastPass()).not.toBeNull()
  away = true
  await vi.advanceTimersByTimeAsync(5_000)
  expect(onError).toHaveBeenCalledTimes(2)
})

test('a step that fails does not keep the others from their work', async () => {
  const second = vi.fn(async () => 0)
  const broken = { name: 'broken', run: async () => Promise.reject(new Error('broken')) }
  const steps = [broken, { name: 'second', run: second }]
  worker = startWorker({ db, steps, clock: () => new Date(), onError: () => {} })
  await vi.advanceTimersByTimeAsync(0)
  expect(second).toHaveBeenCalledTimes(1)
})

test('stopping lets the step under way finish and begins no other', async () => {
  let finish = () => {}
  const run = vi.fn(({ stopping }: { stopping: () => boolean }) => {
    return new Promise<number>(resolve => {
      finish = () => resolve(stopping() ? 1 : 0)
    })
  })
  start(run)
  await vi.advanceTimersByTimeAsync(0)
  let stopped = false
  const stop = worker!.stop().then(() => {
    stopped = true
  })
  await vi.advanceTimersByTimeAsync(60_000)
  expect(stopped).toBe(false)
  finish()
  await stop
  expect(run).toHaveBeenCalledTimes(1)
})
