import type { Force, Held } from '~/notices/notice-force'

const day = 86_400_000

/** A notice at a moment: its begin and end in days from then (null: no end). */
const notice = (from: number, to: number | null, rest: Partial<Held> = {}) => {
  return (now: Date): Held => ({
    state: 'published',
    startsAt: new Date(now.getTime() + from * day),
    endsAt: to === null ? null : new Date(now.getTime() + to * day),
    whileOpen: false,
    hazardOpen: true,
    ...rest,
  })
}

/** When a notice holds, for the rule and for the database, which must say the same. */
export const forceCases: { title: string; held: (now: Date) => Held; force: Force }[] = [
  { title: 'without an end holds', held: notice(-9, null), force: 'in_force' },
  { title: 'holds from its first moment', held: notice(0, null), force: 'in_force' },
  { title: 'does not hold before it begins', held: notice(1, 9), force: 'ahead' },
  { title: 'holds up to its end', held: notice(-9, 1), force: 'in_force' },
  { title: 'is over at its end', held: notice(-9, 0), force: 'over' },
  { title: 'is over after its end, whatever its hazard is', held: notice(-9, -1), force: 'over' },
  {
    title: 'that stands while its hazard is open outlives its end',
    held: notice(-9, -1, { whileOpen: true }),
    force: 'in_force',
  },
  {
    title: 'that stands while its hazard is open still has its days when the hazard is not',
    held: notice(-1, 6, { whileOpen: true, hazardOpen: false }),
    force: 'in_force',
  },
  {
    title: 'that stands while its hazard is open is over when neither lasts',
    held: notice(-9, -1, { whileOpen: true, hazardOpen: false }),
    force: 'over',
  },
  {
    title: 'withdrawn holds no more, though its hazard is open',
    held: notice(-1, 6, { state: 'withdrawn', whileOpen: true }),
    force: 'withdrawn',
  },
  { title: 'in draft does not hold', held: notice(-1, 6, { state: 'draft' }), force: 'draft' },
]
