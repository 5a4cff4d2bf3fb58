import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import express from 'express'
import sharp from 'sharp'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { photos } from '~/db/schema/reports'
import { inTransaction } from '~/db/transaction.server'
import { photoLimits } from '~/reports/photo'
import { takePhotoFile } from '~/reports/photo-files.server'
import { claimPhotos, listStaged, sweepStaged } from '~/reports/photos.server'
import { takeUploads } from '~/reports/uploads.server'
import type { Uploads } from '~/reports/uploads-context'
import { testDatabase } from '../database'
import { actBy, now, photoDir } from '../demo'

const { db, empty } = await testDatabase()
mkdirSync(join(photoDir, 'incoming'), { recursive: true })
const day = 86_400_000

beforeEach(empty)

const jpeg = (width = 800, height = 600) =>
  sharp({ create: { width, height, channels: 3, background: '#887766' } })
    .withExif({ IFD0: { Make: 'Invented' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '33/1 22/1 0/1' } })
    .jpeg()
    .toBuffer()

function put(bytes: Buffer | string): string {
  const path = join(photoDir, 'incoming', `upload-${Math.random()}`)
  writeFileSync(path, bytes)
  return path
}

describe('A photo taken up', () => {
  it('is kept in every size, without what the camera wrote, and the upload is gone', async () => {
    const path = put(await jpeg(3000, 1500))
    const taken = await takePhotoFile(photoDir, path)
    expect(readdirSync(join(photoDir, taken.key)).sort()).toEqual([
      '2048.webp',
      '320.webp',
      '960.jpg',
      '960.webp',
      'master.jpg',
    ])
    for (const file of readdirSync(join(photoDir, taken.key))) {
      const { exif, xmp, iptc } = await sharp(join(photoDir, taken.key, file)).metadata()
      expect([exif, xmp, iptc], file).toEqual([undefined, undefined, undefined])
    }
    expect(existsSync(path)).toBe(false)
    expect(taken).toMatchObject({ width: 2048, height: 1024 })
  })

  it.each([
    ['a text', Buffer.from('no photo at all'), /not a photo we can read/],
    [
      'a drawing that could carry scripts',
      Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script/></svg>'),
      /not a photo/,
    ],
    ['nothing', Buffer.alloc(0), /not a photo we can read/],
  ])('is refused in a sentence when it is %s', async (_, bytes, sentence) => {
    await expect(takePhotoFile(photoDir, put(bytes))).rejects.toThrow(sentence)
    expect(readdirSync(join(photoDir, 'incoming'))).toEqual([])
  })

  it('is refused when only part of it arrived', async () => {
    const whole = await jpeg(2000, 1500)
    await expect(takePhotoFile(photoDir, put(whole.subarray(0, whole.length / 2)))).rejects.toThrow(/broken/)
  })

  it('is refused when it has more pixels than fit', async () => {
    const wide = await sharp({ create: { width: 9000, height: 6000, channels: 3, background: '#fff' } })
      .png({ compressionLevel: 9 })
      .toBuffer()
    await expect(takePhotoFile(photoDir, put(wide))).rejects.toThrow(
      /54 million pixels; at most 50 million fit/,
    )
  })
})

describe('A form with photos', () => {
  let uploads: Uploads | null = null
  let tooOften: string | null = null
  let url = ''
  const app = express()
  app.post(
    '/form',
    takeUploads({
      photoDir,
      db,
      ownerOf: request => (request.get('x-owner') as string | undefined) ?? null,
      countForm: async () => tooOften,
      toAct: () => actBy(null),
    }),
    (request, response) => {
      uploads = (request as typeof request & { uploads?: Uploads }).uploads ?? null
      response.end('ok')
    },
  )
  const server = createServer(app)
  beforeAll(async () => {
    await new Promise<void>(done => server.listen(0, '127.0.0.1', done))
    url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/form`
  })
  afterAll(() => void server.close())

  async function send(files: [string, Buffer][], owner: string | null = 'owner-hash') {
    uploads = null
    const form = new FormData()
    form.append('words', 'Ринг')
    for (const [name, bytes] of files) form.append('photos', new Blob([new Uint8Array(bytes)]), name)
    return await fetch(url, {
      method: 'POST',
      body: form,
      headers: owner === null ? {} : { 'x-owner': owner },
    })
  }

  it('keeps the good photos beside the bad ones, each of which gets its sentence', async () => {
    const good = await jpeg()
    await send([
      ['ring.jpg', good],
      ['Кольцо.txt', Buffer.from('text')],
      ['top.jpg', good],
    ])
    expect(uploads!.formData.get('words')).toBe('Ринг')
    expect(uploads!.staged).toHaveLength(2)
    expect(uploads!.refused).toEqual([expect.stringContaining('“Кольцо.txt” is not a photo we can read')])
  })

  it('refuses a photo that is too large, and keeps the others', async () => {
    await send([
      ['large.jpg', Buffer.alloc(photoLimits.bytes + 1)],
      ['ring.jpg', await jpeg()],
    ])
    expect(uploads!.refused).toEqual([expect.stringContaining('“large.jpg” is larger than 25 MB')])
    expect(uploads!.staged).toHaveLength(1)
  })

  it('takes the first six and names the rest', async () => {
    const good = await jpeg(100, 100)
    await send(Array.from({ length: 8 }, (_, i) => [`${i}.jpg`, good]))
    expect(uploads!.staged).toHaveLength(6)
    expect(uploads!.refused).toHaveLength(2)
  })

  it('is refused before anything is written when the browser kept no cookie', async () => {
    expect((await send([['ring.jpg', await jpeg()]], null)).status).toBe(403)
    expect(await db.select().from(photos)).toEqual([])
  })

  it('comes back with its words when too many came from here', async () => {
    tooOften = 'More photos came from here in an hour than we take.'
    await send([['ring.jpg', await jpeg()]])
    tooOften = null
    expect(uploads).toMatchObject({
      staged: [],
      refused: ['More photos came from here in an hour than we take.'],
    })
    expect(uploads!.formData.get('words')).toBe('Ринг')
    expect(readdirSync(join(photoDir, 'incoming'))).toEqual([])
  })

  it('leaves its photos to whoever sent them, for a day', async () => {
    await send([['ring.jpg', await jpeg()]])
    const keys = uploads!.staged.map(photo => photo.key)
    expect(await listStaged(db, 'owner-hash', keys, now)).toHaveLength(1)
    expect(await listStaged(db, 'somebody-else', keys, now)).toEqual([])
    const claim = {
      keys,
      stagedBy: 'somebody-else',
      target: { workRecordId: '00000000-0000-7000-8000-000000000000' },
    }
    expect(await inTransaction(db, tx => claimPhotos(tx, actBy(null), claim))).toBe(0)
    expect(await sweepStaged(db, new Date(now.getTime() + day - 1000))).toEqual([])
    expect(await sweepStaged(db, new Date(now.getTime() + day + 1000))).toEqual(keys)
  })
})
