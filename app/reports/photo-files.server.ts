import { createHash, randomBytes } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { mkdir, readFile, rename, rm } from 'node:fs/promises'
import { join } from 'node:path'
import sharp from 'sharp'
import { photoLimits, photoWidths } from './photo'

sharp.cache(false)
sharp.concurrency(1)

/** What a photo became: its key is random and the only name of its files. */
export interface TakenPhoto {
  key: string
  width: number
  height: number
  sha256: string
}

/** A file that cannot be taken, with a sentence that says why and what to do. */
export class PhotoRefused extends Error {
  override name = 'PhotoRefused'
}

const kinds = new Set(['jpeg', 'png', 'webp', 'gif', 'tiff', 'avif'])
const heic =
  'is a HEIC picture, which cannot be read yet. Set the camera to "most compatible" or send a JPEG.'

/** At most two pictures are worked on at once; others wait their turn. */
const waiting: (() => void)[] = []
let running = 0

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= 2) await new Promise<void>(resolve => waiting.push(resolve))
  running++
  try {
    return await work()
  } finally {
    running--
    waiting.shift()?.()
  }
}

async function hashFile(path: string): Promise<string> {
  const hash = createHash('sha256')
  for await (const chunk of createReadStream(path)) hash.update(chunk as Buffer)
  return hash.digest('hex')
}

async function checkPicture(path: string): Promise<void> {
  const found = await sharp(path, { limitInputPixels: false })
    .metadata()
    .catch(() => null)
  if (found === null) throw new PhotoRefused('is not a photo we can read. Send a JPEG, PNG or WebP.')
  if (found.format === 'heif' && found.compression !== 'av1') throw new PhotoRefused(heic)
  if (!kinds.has(found.format) && found.format !== 'heif')
    throw new PhotoRefused('is not a photo. Send a JPEG, PNG or WebP.')
  if (found.width * found.height > photoLimits.pixels)
    throw new PhotoRefused(
      `has ${Math.round((found.width * found.height) / 1e6)} million pixels; at most ${photoLimits.pixels / 1e6} million fit. Send a smaller one.`,
    )
}

async function writeSizes(path: string, folder: string): Promise<{ width: number; height: number }> {
  // upright by its own mark, then everything the camera wrote (place, time, maker) is left behind
  const upright = sharp(path, { limitInputPixels: photoLimits.pixels, failOn: 'error', pages: 1 })
    .autoOrient()
    .resize({ width: 2048, height: 2048, fit: 'inside', withoutEnlargement: true })
  const master = await upright.jpeg({ quality: 90, mozjpeg: false }).toFile(join(folder, 'master.jpg'))
  const sized = (width: number) =>
    sharp(join(folder, 'master.jpg')).resize({
      width,
      height: width,
      fit: 'inside',
      withoutEnlargement: true,
    })
  for (const width of photoWidths)
    await sized(width)
      .webp({ quality: 80 })
      .toFile(join(folder, `${width}.webp`))
  await sized(960).jpeg({ quality: 82 }).toFile(join(folder, '960.jpg'))
  return { width: master.width, height: master.height }
}

/**
 * Takes an uploaded file up: reads it as a picture, writes the sizes (WebP 320, 960, 2048; JPEG 960 for mails; a
 * stripped JPEG master) under a new random key, and deletes the upload. Throws `PhotoRefused` with a sentence when it
 * is no photo, broken or too large.
 */
export async function takePhotoFile(photoDir: string, path: string): Promise<TakenPhoto> {
  return await inTurn(async () => {
    const key = randomBytes(16).toString('hex')
    const working = join(photoDir, 'incoming', key)
    try {
      await checkPicture(path)
      await mkdir(working, { recursive: true })
      const size = await writeSizes(path, working).catch(() => {
        throw new PhotoRefused(
          'is broken: only part of it arrived or it cannot be read. Take or choose it again.',
        )
      })
      const sha256 = await hashFile(join(working, 'master.jpg'))
      await rename(working, join(photoDir, key))
      return { key, ...size, sha256 }
    } finally {
      await rm(working, { recursive: true, force: true })
      await rm(path, { force: true })
    }
  })
}

/** Where one size of a photo lies. The key must have come from the database. */
export function toPhotoPath(photoDir: string, key: string, file: string): string {
  return join(photoDir, key, file)
}

/** The picture a mail shows: the JPEG of 960 pixels. */
export async function readMailPicture(photoDir: string, key: string): Promise<Buffer> {
  return await readFile(toPhotoPath(photoDir, key, '960.jpg'))
}
