import { randomBytes } from 'node:crypto'
import type { Act } from '~/record/act'
import { toAct } from '~/record/acts.server'

export const noon = new Date('2027-03-12T12:00:00.000Z')

/** A moment so many milliseconds after noon of the tests' day. */
export const later = (milliseconds: number) => new Date(noon.getTime() + milliseconds)
export const minute = 60_000
export const hour = 60 * minute
export const day = 24 * hour

/** The circumstances of a command by somebody not signed in. */
export const actAt = (now: Date): Act => toAct(now, { kind: 'guest', personId: null })

export const newSecret = () => randomBytes(32).toString('base64url')
