import { createHash } from 'node:crypto'
import { gzipSync } from 'node:zlib'
import { zxyToTileId } from 'pmtiles'

/** What stands in the archive's header and metadata; degrees, and layers in TileJSON's form. */
export interface ArchiveFacts {
  name: string
  attribution: string
  bounds: { west: number; south: number; east: number; north: number }
  centre: { lon: number; lat: number; zoom: number }
  vectorLayers: { id: string; fields: Record<string, string>; minzoom: number; maxzoom: number }[]
}

interface Entry {
  id: number
  run: number
  offset: number
  length: number
}

/** Gathers tiles and gives the whole archive (PMTiles v3, clustered, gzip); equal tiles are kept once. */
export class Archive {
  readonly #tiles = new Map<number, Buffer>()
  #minZoom = 99
  #maxZoom = 0

  /** Adds one encoded vector tile; it is gzipped here. */
  add(z: number, x: number, y: number, tile: Uint8Array): void {
    this.addPacked(z, x, y, packed(tile))
  }

  /** Adds a tile that is gzipped already, for one used in many places. */
  addPacked(z: number, x: number, y: number, tile: Buffer): void {
    this.#tiles.set(zxyToTileId(z, x, y), tile)
    this.#minZoom = Math.min(this.#minZoom, z)
    this.#maxZoom = Math.max(this.#maxZoom, z)
  }

  /** The bytes of the archive, the same for the same tiles whatever the order they were added in. */
  toBytes(facts: ArchiveFacts): Buffer {
    const { entries, data, contents } = this.#laidOut()
    const { root, leaves } = directories(entries)
    const metadata = packed(
      Buffer.from(
        JSON.stringify({
          name: facts.name,
          attribution: facts.attribution,
          type: 'baselayer',
          format: 'pbf',
          vector_layers: facts.vectorLayers,
        }),
      ),
    )
    const header = Buffer.alloc(127)
    header.write('PMTiles', 0, 'ascii')
    header[7] = 3
    let offset = 127
    let at = 8
    for (const part of [root, metadata, leaves, data]) {
      header.writeBigUInt64LE(BigInt(offset), at)
      header.writeBigUInt64LE(BigInt(part.length), at + 8)
      offset += part.length
      at += 16
    }
    for (const [i, count] of [this.#tiles.size, entries.length, contents].entries())
      header.writeBigUInt64LE(BigInt(count), 72 + 8 * i)
    header.set([1, 2, 2, 1, this.#minZoom, this.#maxZoom], 96)
    const { west, south, east, north } = facts.bounds
    for (const [i, degrees] of [west, south, east, north].entries())
      header.writeInt32LE(Math.round(degrees * 1e7), 102 + 4 * i)
    header[118] = facts.centre.zoom
    header.writeInt32LE(Math.round(facts.centre.lon * 1e7), 119)
    header.writeInt32LE(Math.round(facts.centre.lat * 1e7), 123)
    return Buffer.concat([header, root, metadata, leaves, data])
  }

  #laidOut(): { entries: Entry[]; data: Buffer; contents: number } {
    const kept = new Map<string, { offset: number; length: number }>()
    const parts: Buffer[] = []
    const entries: Entry[] = []
    let end = 0
    for (const [id, tile] of [...this.#tiles].sort(([a], [b]) => a - b)) {
      const key = createHash('sha256').update(tile).digest('base64')
      let place = kept.get(key)
      if (!place) {
        place = { offset: end, length: tile.length }
        kept.set(key, place)
        parts.push(tile)
        end += tile.length
      }
      const last = entries.at(-1)
      if (last && last.offset === place.offset && last.id + last.run === id) last.run++
      else entries.push({ id, run: 1, ...place })
    }
    return { entries, data: Buffer.concat(parts), contents: kept.size }
  }
}

/** Gzip at its best; the header's byte for the operating system is fixed so that every machine gives the same bytes. */
export function packed(bytes: Uint8Array): Buffer {
  const out = gzipSync(bytes, { level: 9 })
  out[9] = 255
  return out
}

const rootRoom = 16_384 - 127

/** One root directory if it fits in the first 16 kB, else a root of leaves of equal size. */
function directories(entries: Entry[]): { root: Buffer; leaves: Buffer } {
  const whole = directory(entries)
  if (whole.length <= rootRoom) return { root: whole, leaves: Buffer.alloc(0) }
  for (let size = 4096; ; size *= 2) {
    const leaves: Buffer[] = []
    const pointers: Entry[] = []
    let offset = 0
    for (let i = 0; i < entries.length; i += size) {
      const leaf = directory(entries.slice(i, i + size))
      pointers.push({ id: entries[i]!.id, run: 0, offset, length: leaf.length })
      leaves.push(leaf)
      offset += leaf.length
    }
    const root = directory(pointers)
    if (root.length <= rootRoom) return { root, leaves: Buffer.concat(leaves) }
  }
}

function directory(entries: Entry[]): Buffer {
  const bytes: number[] = []
  const varint = (value: number) => {
    let rest = value
    while (rest >= 128) {
      bytes.push((rest % 128) | 128)
      rest = Math.floor(rest / 128)
    }
    bytes.push(rest)
  }
  varint(entries.length)
  entries.forEach((entry, i) => {
    varint(entry.id - (entries[i - 1]?.id ?? 0))
  })
  for (const { run } of entries) varint(run)
  for (const { length } of entries) varint(length)
  entries.forEach(({ offset }, i) => {
    const before = entries[i - 1]
    varint(before && offset === before.offset + before.length ? 0 : offset + 1)
  })
  return packed(Uint8Array.from(bytes))
}
