import { type Material, type PartKind, partKindWords } from './part'

interface Named {
  kind: PartKind
  material: Material
  sizeMm: number | null
  fittedOn: string | null
}

/** The part that names a fixed point on the line: what the rope or connector hangs on, with its year. */
export function formatGearShort(parts: readonly Named[]): string {
  const part = parts.find(one => one.kind === 'ring' || one.kind === 'lower_off_hook') ?? parts[0]
  if (part === undefined) return 'parts not on record'
  const year = part.fittedOn === null ? 'age not known' : part.fittedOn.slice(0, 4)
  return `${shortKind[part.kind] ?? partKindWords[part.kind].toLowerCase()}, ${year}`
}

const shortKind: Partial<Record<PartKind, string>> = {
  bonded_eye: 'glue-in',
  bonded_staple: 'glue-in',
  bonded_stud: 'glue-in stud',
  wedge_bolt: 'expansion bolt',
  sleeve_bolt: 'expansion bolt',
}

/** When a part was fitted, as exactly as it is known. */
export function formatFitted(
  part: { fittedOn: string | null; fittedPrecision: string },
  formatDay: (day: string) => string,
): string {
  if (part.fittedOn === null || part.fittedPrecision === 'unknown') return 'not known'
  if (part.fittedPrecision === 'year') return part.fittedOn.slice(0, 4)
  if (part.fittedPrecision === 'month') return formatDay(part.fittedOn).split(' ').slice(1).join(' ')
  return formatDay(part.fittedOn)
}
