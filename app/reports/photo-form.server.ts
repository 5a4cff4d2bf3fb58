import { data } from 'react-router'
import type { Queryable } from '~/db/client.server'
import type { KnownViewer } from '~/people/viewer-context'
import { readForm, toTyped } from '~/web/forms.server'
import type { FormAnswer, Typed } from '~/web/responses'
import { listStaged } from './photos.server'
import type { StagedPhoto, Uploads } from './uploads-context'

export interface PhotoFormAnswer extends FormAnswer {
  staged: StagedPhoto[]
  refused: string[]
}

/** A form with photos, read: fields, the photos that will go with it, and how it is answered when it cannot be taken. */
export interface PhotoForm {
  data: FormData
  typed: Typed
  staged: StagedPhoto[]
  refused: string[]
  /** 400 with the photos kept */
  invalid(errors: Record<string, string>): ReturnType<typeof data<PhotoFormAnswer>>
  /** 409 with the photos kept */
  refuse(reason: string): ReturnType<typeof data<PhotoFormAnswer>>
}

/**
 * Reads a form whose photos the upload middleware took up: those new, and those an earlier try left staged for this
 * browser. Photos refused now stay named until the person sends again.
 */
export async function readPhotoForm(given: {
  request: Request
  db: Queryable
  uploads: Uploads | null
  viewer: KnownViewer
  now: Date
}): Promise<PhotoForm> {
  const { uploads, viewer } = given
  const form = uploads?.formData ?? (await readForm(given.request))
  const owner = viewer.sessionHash ?? viewer.guestHash
  const named = form.getAll('photo').filter(value => typeof value === 'string')
  const before = owner === null ? [] : await listStaged(given.db, owner, named, given.now).catch(() => [])
  const staged = [
    ...before.map(({ key, width, height }) => ({ key, width, height })),
    ...(uploads?.staged ?? []),
  ]
  const refused = uploads?.refused ?? []
  const typed = toTyped(form)
  const answer = (status: number, errors: Record<string, string>, reason?: string) =>
    data<PhotoFormAnswer>({ errors, typed, reason, staged, refused }, { status })
  return {
    data: form,
    typed,
    staged,
    refused,
    invalid: errors => answer(400, errors),
    refuse: reason => answer(409, {}, reason),
  }
}
