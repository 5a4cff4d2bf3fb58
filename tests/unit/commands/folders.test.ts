import { existsSync, mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { requireFolders } from '../../../app/commands/folders.mjs'

let top: string
beforeEach(() => {
  top = mkdtempSync(join(tmpdir(), 'folders-'))
})
afterEach(() => rmSync(top, { recursive: true }))

const prepare = (dataDir: string, photoDir = join(dataDir, 'photos')) =>
  requireFolders({ dataDir, photoDir, databaseUrl: null })

test('the folders of an installation are made, for their owner alone', async () => {
  await prepare(join(top, 'a/b'))
  expect(statSync(join(top, 'a/b')).mode & 0o777).toBe(0o700)
  expect(existsSync(join(top, 'a/b/photos'))).toBe(true)
})

test('folders that are there are taken as they are', async () => {
  await prepare(top)
  await expect(prepare(top)).resolves.toBeUndefined()
})

test('a file in the place of a folder is named, with an example', async () => {
  const file = join(top, 'file')
  writeFileSync(file, '')
  await expect(prepare(file)).rejects.toThrow(/^DATA_DIR is ".*file", but there is a file .*DATA_DIR=\.data$/)
  await expect(prepare(top, join(file, 'photos'))).rejects.toThrow(/^PHOTO_DIR is ".*PHOTO_DIR=/)
})

test('a place where no folder can be made is refused at once', async () => {
  await expect(prepare('/proc/cragfettle')).rejects.toThrow(/^DATA_DIR is "\/proc\/cragfettle", but/)
})
