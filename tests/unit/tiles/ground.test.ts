import { createHash } from 'node:crypto'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { gunzipSync } from 'node:zlib'
import { VectorTile } from '@mapbox/vector-tile'
import type { LineString, MultiLineString } from 'geojson'
import { PbfReader } from 'pbf'
import { PMTiles } from 'pmtiles'
import { BufferReader, S2PMTilesReader } from 's2-pmtiles'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildGround } from '../../../tiles/build'
import { tileOf } from '../../../tiles/cut'
import { cragPlaces } from '../../../tiles/places'

const folder = mkdtempSync(join(tmpdir(), 'ground-'))
const outFile = join(folder, 'ground.pmtiles')
const progress: number[] = []
let seconds = 0
let bytes: Buffer

beforeAll(async () => {
  const start = performance.now()
  await buildGround({ outFile, onProgress: share => progress.push(share) })
  seconds = (performance.now() - start) / 1000
  bytes = readFileSync(outFile)
}, 60_000)
afterAll(() => rmSync(folder, { recursive: true }))

const archive = () =>
  new PMTiles({
    getKey: () => outFile,
    getBytes: async (offset, length) => ({
      data: Uint8Array.from(bytes.subarray(offset, offset + length)).buffer,
    }),
  })

async function readTile(z: number, x: number, y: number) {
  const found = await archive().getZxy(z, x, y)
  return found ? new VectorTile(new PbfReader(new Uint8Array(found.data))) : null
}

const tileAt = (lon: number, lat: number, z: number) => readTile(z, ...tileOf(lon, lat, z))

describe('the ground of Skerrow', () => {
  it('is built in well under a minute into less than 25 MB, telling how far it is', () => {
    expect(seconds).toBeLessThan(40)
    expect(bytes.length).toBeLessThan(25e6)
    expect(progress.at(-1)).toBe(1)
    expect(progress).toEqual(progress.toSorted((a, b) => a - b))
  })

  it('is the same to the last byte when it is built again', async () => {
    const again = join(folder, 'again.pmtiles')
    await buildGround({ outFile: again })
    const digest = (data: Buffer) => createHash('sha256').update(data).digest('hex')
    expect(digest(readFileSync(again))).toBe(digest(bytes))
  }, 60_000)

  it('says in its header where it lies and which zooms it has', async () => {
    const header = await archive().getHeader()
    expect(header).toMatchObject({ specVersion: 3, clustered: true, tileType: 1, minZoom: 0, maxZoom: 14 })
    expect([header.minLon, header.minLat, header.maxLon, header.maxLat]).toEqual([-30.1, 32.4, -27.1, 34.4])
    expect([header.centerLon, header.centerLat, header.centerZoom]).toEqual([-28.6, 33.4, 12])
    expect(header.tileDataOffset + header.tileDataLength!).toBe(bytes.length)
  })

  it('lists each layer with its attributes, by Shortbread 1.0 names or prefixed x_', async () => {
    // Names: Shortbread 1.0 schema, shortbread-tiles/shortbread-docs, content/schema/1.0.md.
    const shortbread = [
      'ocean',
      'land',
      'water_polygons',
      'water_polygons_labels',
      'water_lines',
      'water_lines_labels',
    ]
    const known = [...shortbread, 'streets', 'buildings', 'place_labels']
    const { vector_layers } = (await archive().getMetadata()) as {
      vector_layers: { id: string; fields: object }[]
    }
    const names = vector_layers.map(({ id }) => id)
    expect(names.filter(name => !known.includes(name) && !name.startsWith('x_'))).toEqual([])
    expect(names).toEqual(
      expect.arrayContaining([...known, 'x_contours', 'x_cliffs', 'x_waterlines', 'x_hillshade']),
    )
    expect(vector_layers.find(({ id }) => id === 'x_contours')?.fields).toEqual({
      ele: 'Number',
      index: 'Boolean',
    })
  })

  it('draws contours each 10 m, every fifth an index line', async () => {
    const tile = (await tileAt(-28.6093, 33.4146, 13))!
    const layer = tile.layers.x_contours!
    const lines = Array.from({ length: layer.length }, (_, i) => layer.feature(i).properties)
    expect(lines.length).toBeGreaterThan(10)
    for (const { ele, index } of lines) {
      expect(Number(ele) % 10).toBe(0)
      expect(index).toBe(Number(ele) % 50 === 0)
    }
    expect(lines.some(({ ele }) => Number(ele) >= 250)).toBe(true)
  })

  it('has a tile everywhere in its box and open sea far from the island', async () => {
    const sea = (await tileAt(-29.9, 32.6, 14))!
    expect(Object.keys(sea.layers)).toEqual(['ocean'])
    expect(await tileAt(-20, 40, 14)).toBeNull()
  })

  it('has land and sea of the world at low zoom', async () => {
    expect(Object.keys((await readTile(0, 0, 0))!.layers)).toEqual(['ocean'])
    expect(await tileAt(10, 25, 6)).toBeNull()
  })

  it.each(Object.entries(cragPlaces))('has a cliff drawn where %s is', async (_name, { lon, lat, face }) => {
    for (const [east, north] of [[lon, lat], ...face] as [number, number][])
      expect(await metresToCliff(east, north)).toBeLessThan(6)
  })

  it('is read the same by another reader of the format', async () => {
    const other = new S2PMTilesReader(new BufferReader(Uint8Array.from(bytes)))
    const [x, y] = tileOf(-28.6, 33.4, 13)
    const theirs = await other.getTile(13, x, y)
    const ours = await archive().getZxy(13, x, y)
    expect(Buffer.from(theirs!)).toEqual(Buffer.from(ours!.data))
  })

  it('keeps its tiles gzipped', async () => {
    const header = await archive().getHeader()
    const first = bytes.subarray(header.tileDataOffset)
    expect(header.tileCompression).toBe(2)
    expect(() => gunzipSync(first.subarray(0, 400), { finishFlush: 2 })).not.toThrow()
  })
})

/** Metres from a place to the nearest cliff line in its zoom 14 tile, the line taken as its drawn segments. */
async function metresToCliff(lon: number, lat: number): Promise<number> {
  const [x, y] = tileOf(lon, lat, 14)
  const layer = (await readTile(14, x, y))!.layers.x_cliffs
  if (!layer) return Number.POSITIVE_INFINITY
  const perDegree = { lon: 93_029, lat: 110_912 }
  let best = Number.POSITIVE_INFINITY
  for (let i = 0; i < layer.length; i++) {
    const geometry = layer.feature(i).toGeoJSON(x, y, 14).geometry as LineString | MultiLineString
    const lines = geometry.type === 'LineString' ? [geometry.coordinates] : geometry.coordinates
    for (const line of lines)
      for (let k = 0; k + 1 < line.length; k++) {
        const [a, b] = [line[k]!, line[k + 1]!].map(p => [
          (p[0]! - lon) * perDegree.lon,
          (p[1]! - lat) * perDegree.lat,
        ])
        best = Math.min(best, toSegment(a as [number, number], b as [number, number]))
      }
  }
  return best
}

function toSegment(a: [number, number], b: [number, number]): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const t = Math.min(1, Math.max(0, -(a[0] * dx + a[1] * dy) / (dx * dx + dy * dy || 1)))
  return Math.hypot(a[0] + dx * t, a[1] + dy * t)
}
