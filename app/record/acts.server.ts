import { createHash, randomBytes } from 'node:crypto'
import { toUuid7 } from '~/lib/uuid'
import type { Act } from './act'

const random = (bytes: number) => new Uint8Array(randomBytes(bytes))

/** The circumstances of a real command: this moment and the machine's randomness. */
export function toAct(now: Date, by: Act['by']): Act {
  return {
    now,
    by,
    newId: () => toUuid7(now, random),
    newSecret: () => randomBytes(32).toString('base64url'),
    random,
  }
}

/** SHA-256 in hex: what is stored of a secret. */
export function hashSecret(secret: string): string {
  return createHash('sha256').update(secret).digest('hex')
}
