import { createHash } from 'node:crypto'
import { type FileHandle, open, stat } from 'node:fs/promises'
import { gunzipSync } from 'node:zlib'
import { Compression, type Header, PMTiles, SharedPromiseCache, type Source, TileType } from 'pmtiles'

/** An open archive of ground tiles; `etag` names its contents. */
export interface Ground {
  file: string
  etag: string
  metadata: {
    bounds: [number, number, number, number]
    minZoom: number
    maxZoom: number
    attribution: string
  }
  /** How the tiles' bodies are packed, as Content-Encoding says it; null for not at all. */
  encoding: 'gzip' | 'br' | 'zstd' | null
  /** The stored bytes of a tile, or null where the archive has none; rejects when the file can no longer be read. */
  tile(z: number, x: number, y: number): Promise<{ body: Uint8Array; etag: string } | null>
  close(): Promise<void>
}

const encodings = new Map<Compression, Ground['encoding']>([
  [Compression.None, null],
  [Compression.Gzip, 'gzip'],
  [Compression.Brotli, 'br'],
  [Compression.Zstd, 'zstd'],
])

/**
 * Opens a PMTiles archive of vector tiles for reading by ranges. Rejects with a sentence for people when the file is
 * missing, is no such archive, holds no vector tiles, or is shorter than its header says.
 */
export async function openGround(file: string): Promise<Ground> {
  const handle = await open(file, 'r').catch((cause: NodeJS.ErrnoException) => {
    const why = cause.code === 'ENOENT' ? 'there is no such file' : `it cannot be read (${cause.code})`
    throw new Error(`The ground ${file} cannot be opened: ${why}. Build it with npm run build:ground.`)
  })
  try {
    return await readGround(file, handle)
  } catch (cause) {
    await handle.close()
    throw cause
  }
}

async function readGround(file: string, handle: FileHandle): Promise<Ground> {
  const { size, mtimeMs } = await handle.stat()
  const source = sourceOf(file, handle)
  const stored = async (bytes: ArrayBuffer) => bytes
  // The cache unpacks directories; the tiles stay as they are stored.
  const archive = new PMTiles(source, new SharedPromiseCache(200), stored)
  const header = await archive.getHeader().catch(() => {
    throw new Error(
      `The ground ${file} is not a PMTiles archive of version 3. Build it again or name another file.`,
    )
  })
  requireWhole(file, header, size)
  const etag = createHash('sha256')
    .update(`${size} ${mtimeMs}`)
    .update(new Uint8Array((await source.getBytes(0, Math.min(16_384, size))).data))
    .digest('hex')
    .slice(0, 12)
  return {
    file,
    etag,
    encoding: encodings.get(header.tileCompression) ?? null,
    metadata: await readMetadata(source, header),
    async tile(z, x, y) {
      const found = await archive.getZxy(z, x, y)
      if (!found || found.data.byteLength === 0) return null
      const body = new Uint8Array(found.data)
      return { body, etag: `"${createHash('sha256').update(body).digest('hex').slice(0, 16)}"` }
    },
    close: () => handle.close(),
  }
}

function sourceOf(file: string, handle: FileHandle): Source {
  return {
    getKey: () => file,
    async getBytes(offset, length) {
      const bytes = new Uint8Array(length)
      const { bytesRead } = await handle.read(bytes, 0, length, offset)
      // The first read asks for more than a small archive holds; any other short read is a file cut since.
      if (bytesRead < length && offset > 0)
        throw new Error(`The ground ${file} ends before byte ${offset + length}.`)
      return { data: bytes.buffer.slice(0, bytesRead) }
    },
  }
}

function requireWhole(file: string, header: Header, size: number): void {
  if (header.tileType !== TileType.Mvt)
    throw new Error(`The ground ${file} holds no vector tiles. Name an archive of vector tiles (MVT).`)
  const end = header.tileDataOffset + (header.tileDataLength ?? 0)
  if (size < end)
    throw new Error(
      `The ground ${file} is cut short: ${size} of ${end} bytes are there. Copy it again or build it with npm run build:ground.`,
    )
}

async function readMetadata(source: Source, header: Header): Promise<Ground['metadata']> {
  const { data } = await source.getBytes(header.jsonMetadataOffset, header.jsonMetadataLength)
  const bytes = new Uint8Array(data)
  const json = header.internalCompression === Compression.Gzip ? gunzipSync(bytes) : Buffer.from(bytes)
  const { attribution } = JSON.parse(json.toString('utf8')) as { attribution?: unknown }
  return {
    bounds: [header.minLon, header.minLat, header.maxLon, header.maxLat],
    minZoom: header.minZoom,
    maxZoom: header.maxZoom,
    attribution: typeof attribution === 'string' ? attribution : '',
  }
}

const closeAfter = 30_000

/**
 * A function that opens the ground at its first use and keeps it. It opens it anew when the file was replaced, and
 * after a failure tries again at the next use, so a ground built or mended later needs no restart.
 */
export function keepGround(file: string): () => Promise<Ground> {
  let kept: { state: string; ground: Promise<Ground> } | null = null
  return async () => {
    const state = await stateOf(file)
    if (kept?.state !== state) {
      const before = kept?.ground
      // Whoever was given the old one a moment ago may still read from it.
      if (before) setTimeout(() => before.then(ground => ground.close()).catch(() => {}), closeAfter).unref()
      const ground = openGround(file)
      kept = { state, ground }
      ground.catch(() => {
        if (kept?.ground === ground) kept = null
      })
    }
    return kept!.ground
  }
}

const stateOf = (file: string) =>
  stat(file).then(
    ({ ino, size, mtimeMs }) => `${ino} ${size} ${mtimeMs}`,
    () => 'missing',
  )
