/** Kinds of part at a fixed point, in the trade's words. */
export const partKinds = [
  'wedge_bolt',
  'sleeve_bolt',
  'self_drilled',
  'drive_in',
  'screw_in',
  'bonded_eye',
  'bonded_staple',
  'bonded_stud',
  'hanger',
  'ring',
  'lower_off_hook',
  'cold_shut',
  'swivel',
  'chain',
  'quick_link',
  'fixed_draw',
  'connector',
  'sling',
  'cord',
  'cable',
  'resin',
  'peg',
  'thread',
] as const
export type PartKind = (typeof partKinds)[number]

export const partKindWords: Record<PartKind, string> = {
  wedge_bolt: 'Wedge bolt',
  sleeve_bolt: 'Sleeve bolt',
  self_drilled: 'Self-drilled bolt',
  drive_in: 'Drive-in bolt',
  screw_in: 'Screw-in bolt',
  bonded_eye: 'Glue-in eye',
  bonded_staple: 'Glue-in staple',
  bonded_stud: 'Glue-in stud',
  hanger: 'Plate hanger',
  ring: 'Ring',
  lower_off_hook: 'Lower-off hook',
  cold_shut: 'Cold shut',
  swivel: 'Swivel',
  chain: 'Chain',
  quick_link: 'Quick link',
  fixed_draw: 'Fixed draw',
  connector: 'Fixed connector',
  sling: 'Sling',
  cord: 'Cord',
  cable: 'Cable',
  resin: 'Resin',
  peg: 'Peg',
  thread: 'Thread',
}

export const materials = [
  'plated_steel',
  'stainless',
  'stainless_resistant',
  'titanium',
  'steel',
  'aluminium',
  'fabric',
  'unknown',
] as const
export type Material = (typeof materials)[number]

export const materialWords: Record<Material, string> = {
  plated_steel: 'plated steel',
  stainless: 'stainless',
  stainless_resistant: 'stainless for the sea',
  titanium: 'titanium',
  steel: 'steel',
  aluminium: 'aluminium',
  fabric: 'fabric',
  unknown: 'material not known',
}

/** How exactly a fitting date is known. */
export const datePrecisions = ['day', 'month', 'year', 'unknown'] as const
export type DatePrecision = (typeof datePrecisions)[number]

/** Sides of a two-point station. */
export const sides = ['a', 'b'] as const
export type Side = (typeof sides)[number]

/** One line naming a part: kind, material, bar size. */
export function formatPart(part: { kind: PartKind; material: Material; sizeMm: number | null }): string {
  const size = part.sizeMm === null ? '' : `, ${part.sizeMm} mm`
  return `${partKindWords[part.kind]}, ${materialWords[part.material]}${size}`
}
