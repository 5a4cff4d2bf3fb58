import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { makeWhenChanged } from '../../../app/commands/sources.mjs'

let folder: string
let made: number
beforeEach(() => {
  made = 0
  folder = mkdtempSync(join(tmpdir(), 'sources-'))
  mkdirSync(join(folder, 'src'))
  writeFileSync(join(folder, 'src', 'a.ts'), 'one')
})
afterEach(() => rmSync(folder, { recursive: true }))

const make = (work = async () => {}) =>
  makeWhenChanged(
    {
      stamp: join(folder, 'out', 'stamp'),
      sources: [join(folder, 'src')],
      results: [join(folder, 'out', 'result')],
    },
    async () => {
      made++
      mkdirSync(join(folder, 'out'), { recursive: true })
      writeFileSync(join(folder, 'out', 'result'), 'made')
      await work()
    },
  )

test('what was made from the same sources is not made again', async () => {
  expect(await make()).toBe(true)
  expect(await make()).toBe(false)
  expect(made).toBe(1)
})

test.each([
  ['a file changes', () => writeFileSync(join(folder, 'src', 'a.ts'), 'two')],
  ['a file comes', () => writeFileSync(join(folder, 'src', 'b.ts'), '')],
  ['a file goes', () => rmSync(join(folder, 'src', 'a.ts'))],
  ['the result is gone', () => rmSync(join(folder, 'out', 'result'))],
])('it is made again when %s', async (_, change) => {
  await make()
  change()
  expect(await make()).toBe(true)
})

test('what failed half-way is made again', async () => {
  await expect(make(() => Promise.reject(new Error('broken')))).rejects.toThrow('broken')
  expect(await make()).toBe(true)
})
