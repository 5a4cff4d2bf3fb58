import { toUuid7 } from '../../app/lib/uuid'
import type { Act } from '../../app/record/act'

/** Bytes from a small generator (mulberry32) with a fixed seed, so that the demo is the same each time. */
function seededBytes(seed: number): (bytes: number) => Uint8Array {
  let state = seed
  const next = () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return (t ^ (t >>> 14)) >>> 0
  }
  return bytes => Uint8Array.from({ length: bytes }, () => next() & 0xff)
}

/** What a demo command is given so many days from `now`, by the product itself or by a person. */
export type DemoAct = (days: number, by?: { personId: string }) => Act

export function demoAct(now: Date): DemoAct {
  const random = seededBytes(20261)
  return (days, by) => {
    const at = new Date(now.getTime() + days * 86_400_000)
    return {
      now: at,
      by: by === undefined ? { kind: 'system', personId: null } : { kind: 'person', personId: by.personId },
      newId: () => toUuid7(at, random),
      newSecret: () => Buffer.from(random(32)).toString('base64url'),
      random,
    }
  }
}
