import { mkdirSync } from 'node:fs'
import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import type { NextFunction, Request, RequestHandler, Response } from 'express'
import multer, { MulterError } from 'multer'
import type { Database } from '~/db/client.server'
import type { Act } from '~/record/act'
import { isDatabaseAway } from '~/web/database-away'
import { cappedDisk } from './capped-disk.server'
import { photoLimits } from './photo'
import { PhotoRefused, type TakenPhoto, takePhotoFile } from './photo-files.server'
import { stagePhotos } from './photos.server'
import type { Uploads } from './uploads-context'

/** more are read than taken, so that the surplus gets a sentence each */
const filesRead = 20
const formBytes = photoLimits.files * photoLimits.bytes + 1024 * 1024

function toFormData(body: Record<string, string | string[]>): FormData {
  const formData = new FormData()
  for (const [name, value] of Object.entries(body))
    for (const one of Array.isArray(value) ? value : [value]) formData.append(name, one)
  return formData
}

interface Given {
  photoDir: string
  db: Database
  ownerOf: (request: Request) => string | null
  /** counts the form; a sentence when too many came from here */
  countForm: (request: Request) => Promise<string | null>
  toAct: (request: Request) => Act
}

const megabytes = photoLimits.bytes / 1024 / 1024
const tooLarge = `is larger than ${megabytes} MB. Send a smaller one.`
const tooMany = `came after the first ${photoLimits.files} and was left out. Send the most telling ones.`
const broken = 'The form arrived broken. Try again; photos already taken up are kept.'

/** Takes each file up by itself, so that one bad file does not lose the others. */
async function takeAll(photoDir: string, files: Express.Multer.File[]) {
  const taken: TakenPhoto[] = []
  const refused: string[] = []
  for (const [index, file] of files.entries()) {
    const why = index >= photoLimits.files ? tooMany : file.size > photoLimits.bytes ? tooLarge : null
    try {
      if (why !== null) throw new PhotoRefused(why)
      taken.push(await takePhotoFile(photoDir, file.path))
    } catch (error) {
      if (!(error instanceof PhotoRefused)) throw error
      await rm(file.path, { force: true })
      refused.push(`“${toName(file.originalname)}” ${error.message}`)
    }
  }
  return { taken, refused }
}

/** Stages what was taken up; while the database is away the files go again, and the form goes on to say so. */
async function stageOrDrop(
  given: Given,
  request: Request,
  owner: string,
  taken: TakenPhoto[],
  refused: string[],
): Promise<TakenPhoto[]> {
  try {
    await stagePhotos(given.db, given.toAct(request), owner, taken)
    return taken
  } catch (error) {
    if (!isDatabaseAway(error)) throw error
    for (const { key } of taken) await rm(join(given.photoDir, key), { recursive: true, force: true })
    if (taken.length > 0)
      refused.push('The photos could not be kept just now. Choose them again when you send the form again.')
    return []
  }
}

/** The file's name as the person knows it: browsers send UTF-8, the form parser reads Latin-1. */
function toName(name: string): string {
  return Buffer.from(name, 'latin1').toString('utf8').slice(0, 80)
}

/**
 * Middleware for the routes whose forms carry photos: takes the files up (each on its own: one bad file does not lose
 * the others), stages them for whoever sent them, and leaves fields and outcome on `request.uploads`. A request without
 * a session or guest cookie is refused before anything is written.
 */
export function takeUploads(given: Given): RequestHandler {
  const incoming = join(given.photoDir, 'incoming')
  mkdirSync(incoming, { recursive: true })
  const parse = multer({
    storage: cappedDisk(incoming, photoLimits.bytes),
    limits: { files: filesRead, fields: 200, fieldSize: 100_000 },
  }).array('photos', filesRead)

  return (request: Request, response: Response, next: NextFunction) => {
    if (request.method !== 'POST' || !request.is('multipart/form-data')) return next()
    const owner = given.ownerOf(request)
    if (owner === null)
      return refuse(
        response,
        403,
        'Your browser kept no cookie of this form, so photos cannot be taken up. Allow cookies for this site, open the form again and send it once more.',
      )
    if (Number(request.headers['content-length'] ?? 0) > formBytes)
      return refuse(
        response,
        413,
        `The photos together are larger than ${Math.round(formBytes / 1024 / 1024)} MB. Go back and send fewer at once.`,
      )
    parse(request, response, error => {
      finish(request, owner, error).then(() => next(), next)
    })
  }

  async function finish(request: Request, owner: string, error: unknown) {
    const files = (request.files ?? []) as Express.Multer.File[]
    const uploads: Uploads = { formData: toFormData(request.body ?? {}), staged: [], refused: [] }
    if (error !== undefined && error !== null && !(error instanceof MulterError)) throw error
    if (error instanceof MulterError) uploads.refused.push(broken)
    const tooOften = await given.countForm(request)
    if (tooOften !== null) {
      uploads.refused.push(tooOften)
      await Promise.all(files.map(file => rm(file.path, { force: true })))
      ;(request as Request & { uploads?: Uploads }).uploads = uploads
      return
    }
    const { taken, refused } = await takeAll(given.photoDir, files)
    uploads.staged = await stageOrDrop(given, request, owner, taken, refused)
    uploads.refused.push(...refused)
    ;(request as Request & { uploads?: Uploads }).uploads = uploads
  }
}

function refuse(response: Response, status: number, sentence: string) {
  response.status(status).type('text/plain; charset=utf-8').send(sentence)
}
