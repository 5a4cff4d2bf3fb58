import { mkdirSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { requireAccess, toSocketPath } from '../../../app/commands/database-folder.mjs'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'folder-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

const mode = (path: string) => (statSync(path).mode & 0o777).toString(8)

test('the passwords of the database are readable by the owner of the folder alone', async () => {
  await requireAccess(join(folder, 'database'))
  expect(mode(join(folder, 'database', 'access.json'))).toBe('600')
  expect(mode(join(folder, 'database'))).toBe('700')
})

test('a second start finds the passwords and the port of the first', async () => {
  expect(await requireAccess(folder)).toEqual(await requireAccess(folder))
})

test('two folders never share a password', async () => {
  const one = await requireAccess(join(folder, 'one'))
  const two = await requireAccess(join(folder, 'two'))
  expect(new Set([one.ownerPassword, one.appPassword, two.ownerPassword, two.appPassword]).size).toBe(4)
})

test('a port that somebody else took meanwhile is exchanged for a free one, and that is written down', async () => {
  const first = await requireAccess(folder)
  const taker = createServer()
  await new Promise<void>(done => taker.listen(first.port, '127.0.0.1', done))
  const second = await requireAccess(folder)
  await new Promise(done => taker.close(done))
  expect(second).toEqual({ ...first, port: expect.not.toSatisfy((port: number) => port === first.port) })
  expect(JSON.parse(readFileSync(join(folder, 'access.json'), 'utf8'))).toEqual(second)
})

test('the socket of a folder whose path is too long for one stands in a private folder of its own', () => {
  const deep = join(folder, 'x'.repeat(120))
  mkdirSync(deep)
  const socket = toSocketPath(deep)
  expect(socket.length).toBeLessThan(100)
  expect(mode(dirname(socket))).toBe('700')
  rmSync(dirname(socket), { recursive: true })
})
