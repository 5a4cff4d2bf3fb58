import type { ActorKind } from './activity'

/**
 * What a command is given beside its input: the moment, who acts, and where new ids and secrets come from, so that
 * the same command gives the same rows in a test.
 */
export interface Act {
  now: Date
  by: { kind: ActorKind; personId: string | null; organisationId?: string | null }
  /** a new UUIDv7 */
  newId: () => string
  /** 256 random bits as text for links and cookies; only its hash is stored */
  newSecret: () => string
  /** random bytes, for codes people read */
  random: (bytes: number) => Uint8Array
}
