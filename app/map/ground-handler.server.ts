import { promisify } from 'node:util'
import { brotliDecompress, gunzip } from 'node:zlib'
import type { Request, RequestHandler, Response } from 'express'
import type { Ground } from './ground.server'
import { findTileFault } from './tile'

const day = 86_400
const unpack = { gzip: promisify(gunzip), br: promisify(brotliDecompress) }

/**
 * Answers GET /ground/:z/:x/:y.mvt from the archive that `ground` opens: 200 with ETag and a long life (a year and
 * never asked again where `?v=` names the archive), 204 where it is empty, 304, 400 in a sentence for numbers that
 * cannot be, 404 for a zoom the archive does not have, 503 in a sentence while it cannot be read, the cause to `onFault`.
 */
export function groundHandler(
  ground: () => Promise<Ground>,
  onFault: (cause: unknown) => void = () => {},
): RequestHandler {
  return async (request, response) => {
    const [z, x, y] = [request.params.z, request.params.x, request.params.y].map(toNumber) as [
      number,
      number,
      number,
    ]
    const fault = findTileFault(z, x, y)
    if (fault) return plain(response, 400, fault)
    try {
      const archive = await ground()
      const { minZoom, maxZoom } = archive.metadata
      if (z < minZoom || z > maxZoom)
        return plain(response, 404, `The ground has zooms ${minZoom} to ${maxZoom}; ${z} is none of them.`)
      await answer(archive, await archive.tile(z, x, y), request, response)
    } catch (cause) {
      onFault(cause)
      response.set('Retry-After', '30')
      plain(
        response,
        503,
        'The ground of the map cannot be read just now. The list and all pages work without it.',
      )
    }
  }
}

type Tile = Awaited<ReturnType<Ground['tile']>>

async function answer(archive: Ground, tile: Tile, request: Request, response: Response): Promise<void> {
  const named = request.query.v === archive.etag
  response.set('Cache-Control', named ? `public, max-age=${365 * day}, immutable` : `public, max-age=${day}`)
  response.set('Vary', 'Accept-Encoding')
  if (!tile) {
    response.status(204).end()
    return
  }
  response.set('ETag', tile.etag)
  response.type('application/vnd.mapbox-vector-tile')
  if (request.fresh) {
    response.status(304).end()
    return
  }
  response.end(await bodyFor(archive, tile.body, request, response))
}

/** The body as stored where the client takes that packing, else unpacked. */
async function bodyFor(
  archive: Ground,
  body: Uint8Array,
  request: Request,
  response: Response,
): Promise<Uint8Array> {
  const { encoding } = archive
  if (encoding === null) return body
  if (encoding === 'zstd' || request.acceptsEncodings(encoding)) {
    response.set('Content-Encoding', encoding)
    return body
  }
  return unpack[encoding](body)
}

const toNumber = (digits: unknown): number =>
  typeof digits === 'string' && /^\d{1,9}$/.test(digits) ? Number(digits) : Number.NaN

function plain(response: Response, status: number, sentence: string): void {
  response.status(status).set('Cache-Control', 'no-store').type('text/plain').send(`${sentence}\n`)
}
