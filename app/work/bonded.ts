import type { PartKind } from '~/crags/part'

const bonded: readonly PartKind[] = ['bonded_eye', 'bonded_staple', 'bonded_stud']

/** Whether a part is a bolt held by resin, whose hold nobody can see in a photo. */
export function isBonded(kind: PartKind): boolean {
  return bonded.includes(kind)
}
