import { listParts } from '~/crags/anchors.server'
import type { Material, PartKind, Side } from '~/crags/part'
import type { Queryable, Transaction } from '~/db/client.server'
import { workParts } from '~/db/schema/work'
import { Refusal } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { isBonded } from './bonded'

/** One part fitted, in the place of another or beside what is there. */
export interface FittedPart {
  replaces: string | null
  side: Side | null
  kind: PartKind
  material: Material
  sizeMm: number | null
  marking: string | null
}

/** The parts in place at a fixed point, by the record. */
export async function listInPlace(db: Queryable, anchorId: string) {
  return (await listParts(db, anchorId)).filter(part => part.removedOn === null)
}

/**
 * Writes what a record says was fitted. Refused when a part named as replaced is not in place at the point, or is
 * named twice; a part takes the side of the one it replaces.
 */
export async function insertFitted(
  tx: Transaction,
  act: Act,
  { recordId, anchorId, fitted }: { recordId: string; anchorId: string; fitted: FittedPart[] },
): Promise<void> {
  const there = new Map((await listInPlace(tx, anchorId)).map(part => [part.id, part]))
  for (const { replaces, ...part } of fitted) {
    const old = replaces === null ? null : there.get(replaces)
    if (old === undefined)
      throw new Refusal(
        'A part named as replaced is not in place here any more, or is named twice. Open the form again and choose anew.',
      )
    if (replaces !== null) there.delete(replaces)
    const side = part.side ?? old?.side ?? null
    await tx.insert(workParts).values({ id: act.newId(), workRecordId: recordId, replaces, ...part, side })
  }
}

/** Whether a bonded bolt is in place at a fixed point or among what was fitted, so that photos cannot check it. */
export async function hasBonded(
  db: Queryable,
  anchorId: string,
  fitted: { kind: PartKind | null; replaces: string | null }[],
): Promise<boolean> {
  const gone = new Set(fitted.map(part => part.replaces))
  const stays = (await listInPlace(db, anchorId)).filter(part => !gone.has(part.id))
  return [...stays, ...fitted].some(part => part.kind !== null && isBonded(part.kind))
}
