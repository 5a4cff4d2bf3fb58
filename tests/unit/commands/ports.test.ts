import { createServer, type Server } from 'node:net'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { findFreePort, requireFreePort, toWords } from '../../../app/commands/ports.mjs'

let taker: Server
let port: number
beforeEach(async () => {
  taker = createServer()
  await new Promise<void>(done => taker.listen(0, '127.0.0.1', done))
  port = (taker.address() as { port: number }).port
})
afterEach(() => new Promise<void>(done => taker.close(() => done())))

test('a port that another program uses is refused by its number, with another one as an example', async () => {
  await expect(requireFreePort({ port, host: '127.0.0.1' })).rejects.toThrow(
    `Port ${port} of 127.0.0.1 is in use by another program. End that one, or take another port, for example: PORT=${port + 1} npm start`,
  )
})

test('an address of another machine is refused with one of this machine as an example', async () => {
  await expect(requireFreePort({ port: 3999, host: '192.0.2.1' })).rejects.toThrow(
    'for example: HOST=127.0.0.1',
  )
})

test('a port kept for root is explained', () => {
  expect(toWords('EACCES', 80, '127.0.0.1')).toContain('Take one from 1024 on, for example: PORT=3000')
})

test('where the wanted port is in use another one is found', async () => {
  expect(await findFreePort(port)).not.toBe(port)
})
