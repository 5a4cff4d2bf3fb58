import { mkdtempSync, rmSync, truncateSync, writeFileSync } from 'node:fs'
import { get } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { gunzipSync } from 'node:zlib'
import express from 'express'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type Ground, keepGround, openGround } from '~/map/ground.server'
import { groundHandler } from '~/map/ground-handler.server'
import { Archive } from '../../../tiles/archive'

const folder = mkdtempSync(join(tmpdir(), 'ground-server-'))
const file = join(folder, 'ground.pmtiles')
const lost = join(folder, 'lost.pmtiles')
const tileBytes = Buffer.from('a vector tile, for all the server knows')

function archiveBytes(): Buffer {
  const archive = new Archive()
  archive.add(0, 0, 0, Buffer.from('the world'))
  archive.add(3, 4, 2, tileBytes)
  return archive.toBytes({
    name: 'Test',
    attribution: 'Nobody',
    bounds: { west: -1, south: -2, east: 3, north: 4 },
    centre: { lon: 1, lat: 1, zoom: 2 },
    vectorLayers: [],
  })
}

const faults: unknown[] = []
let base: string
let current: () => Promise<Ground>
const app = express().get(
  '/ground/:z/:x/:y.mvt',
  groundHandler(
    () => current(),
    cause => faults.push(cause),
  ),
)
const server = app.listen(0, '127.0.0.1')

beforeAll(async () => {
  writeFileSync(file, archiveBytes())
  if (!server.listening) await new Promise(done => server.once('listening', done))
  base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
})
beforeEach(() => {
  current = keepGround(file)
})
afterAll(async () => {
  await new Promise(done => server.close(done))
  rmSync(folder, { recursive: true })
})

interface Answer {
  status: number
  headers: Record<string, string | undefined>
  body: Buffer
}

/** One request as written, without the client's own unpacking. */
const ask = (path: string, headers: Record<string, string> = { 'Accept-Encoding': 'gzip' }) =>
  new Promise<Answer>((done, fail) => {
    get(`${base}${path}`, { headers, agent: false }, response => {
      const parts: Buffer[] = []
      response.on('data', part => parts.push(part))
      response.on('end', () =>
        done({
          status: response.statusCode!,
          headers: response.headers as Answer['headers'],
          body: Buffer.concat(parts),
        }),
      )
    }).on('error', fail)
  })

describe('a ground tile', () => {
  it('is sent as it is stored, gzipped, with an ETag and a long life', async () => {
    const { status, headers, body } = await ask('/ground/3/4/2.mvt')
    expect(status).toBe(200)
    expect(gunzipSync(body)).toEqual(tileBytes)
    expect(headers['content-encoding']).toBe('gzip')
    expect(headers['content-type']).toBe('application/vnd.mapbox-vector-tile')
    expect(headers.vary).toContain('Accept-Encoding')
    expect(headers.etag).toMatch(/^"[0-9a-f]{16}"$/)
    expect(headers['cache-control']).toBe('public, max-age=86400')
  })

  it('is kept for a year where the address names the archive', async () => {
    const { etag } = await current()
    const { headers } = await ask(`/ground/3/4/2.mvt?v=${etag}`)
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable')
    const other = await ask('/ground/3/4/2.mvt?v=older')
    expect(other.headers['cache-control']).toBe('public, max-age=86400')
  })

  it('is not sent again to a client that has it', async () => {
    const { headers } = await ask('/ground/3/4/2.mvt')
    const again = await ask('/ground/3/4/2.mvt', { 'If-None-Match': headers.etag! })
    expect([again.status, again.body.length]).toEqual([304, 0])
  })

  it('is unpacked for a client that takes no gzip', async () => {
    const { headers, body } = await ask('/ground/3/4/2.mvt', { 'Accept-Encoding': 'identity' })
    expect(headers['content-encoding']).toBeUndefined()
    expect(body).toEqual(tileBytes)
  })

  it('is empty, 204, where the archive has nothing', async () => {
    const { status, body } = await ask('/ground/3/0/0.mvt')
    expect([status, body.length]).toEqual([204, 0])
  })

  it.each([
    ['/ground/3/8/2.mvt', 'columns and rows go from 0 to 7'],
    ['/ground/3/2/8.mvt', 'columns and rows go from 0 to 7'],
    ['/ground/23/0/0.mvt', 'the largest is 22'],
    ['/ground/a/0/0.mvt', 'three whole numbers'],
    ['/ground/3/-1/0.mvt', 'three whole numbers'],
    ['/ground/3/1.5/0.mvt', 'three whole numbers'],
    ['/ground/3/1e1/0.mvt', 'three whole numbers'],
  ])('asked for as %s is refused in a sentence', async (path, words) => {
    const { status, headers, body } = await ask(path)
    expect(status).toBe(400)
    expect(headers['content-type']).toContain('text/plain')
    expect(body.toString()).toContain(words)
  })

  it('of a zoom that the archive has not is not found', async () => {
    const { status, body } = await ask('/ground/4/0/0.mvt')
    expect(status).toBe(404)
    expect(body.toString()).toContain('zooms 0 to 3')
  })
})

describe('an archive that cannot be read', () => {
  it('is answered with 503 in a sentence, and read as soon as it is there', async () => {
    current = keepGround(lost)
    const { status, headers, body } = await ask('/ground/3/4/2.mvt')
    expect(status).toBe(503)
    expect(headers['cache-control']).toBe('no-store')
    expect(body.toString()).toMatch(/^The ground of the map cannot be read just now/)
    expect(body.toString()).not.toContain(folder)
    writeFileSync(lost, archiveBytes())
    expect((await ask('/ground/3/4/2.mvt')).status).toBe(200)
  })

  it('is refused by name when it is missing, cut short, empty or something else', async () => {
    const wrong = join(folder, 'wrong.pmtiles')
    await expect(openGround(join(folder, 'none'))).rejects.toThrow(/there is no such file/)
    writeFileSync(wrong, archiveBytes().subarray(0, -5))
    await expect(openGround(wrong)).rejects.toThrow(/is cut short: \d+ of \d+ bytes/)
    writeFileSync(wrong, archiveBytes().subarray(0, 60))
    await expect(openGround(wrong)).rejects.toThrow(/is not a PMTiles archive/)
    writeFileSync(wrong, '')
    await expect(openGround(wrong)).rejects.toThrow(/is not a PMTiles archive/)
    writeFileSync(wrong, Buffer.alloc(400, 'x'))
    await expect(openGround(wrong)).rejects.toThrow(/is not a PMTiles archive/)
    await expect(openGround(folder)).rejects.toThrow(/cannot be opened|is not a PMTiles archive/)
  })

  it('cut short while the app runs gives 503, not half a tile', async () => {
    const short = join(folder, 'short.pmtiles')
    writeFileSync(short, archiveBytes())
    current = keepGround(short)
    await current()
    writeFileSync(short, archiveBytes().subarray(0, -20))
    expect((await ask('/ground/3/4/2.mvt')).status).toBe(503)
    writeFileSync(short, archiveBytes())
    expect((await ask('/ground/3/4/2.mvt')).status).toBe(200)
  })

  it('read through an opened archive fails rather than giving half a tile', async () => {
    const short = join(folder, 'half.pmtiles')
    writeFileSync(short, archiveBytes())
    const ground = await openGround(short)
    truncateSync(short, archiveBytes().length - 20)
    await expect(ground.tile(3, 4, 2)).rejects.toThrow(/ends before byte/)
    await ground.close()
  })

  it('tells its cause to the log, the file by name', async () => {
    faults.length = 0
    current = keepGround(join(folder, 'none'))
    await ask('/ground/3/4/2.mvt')
    expect(faults.map(String)).toEqual([expect.stringContaining(join(folder, 'none'))])
  })

  it('tells where it lies and who made it when it is whole', async () => {
    const ground = await openGround(file)
    expect(ground.metadata).toEqual({ bounds: [-1, -2, 3, 4], minZoom: 0, maxZoom: 3, attribution: 'Nobody' })
    await ground.close()
  })
})
