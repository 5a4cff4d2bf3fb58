import type { PartKind } from '~/crags/part'
import { type EdgeClass, edgeClasses } from './finding'
import type { FindingInput, PartInput } from './inputs'
import { type Lognormal, toMeanCube } from './lognormal'
import { toDepthShare } from './measure'
import type { Picker } from './picker'

/** Parts the rope itself runs over. */
const ropeParts: readonly PartKind[] = [
  'ring',
  'lower_off_hook',
  'cold_shut',
  'quick_link',
  'connector',
  'fixed_draw',
  'chain',
  'swivel',
  'sling',
  'cord',
  'cable',
  'bonded_eye',
  'bonded_staple',
  'hanger',
]

const worse = (a: EdgeClass, b: EdgeClass): EdgeClass =>
  edgeClasses.indexOf(a) >= edgeClasses.indexOf(b) ? a : b

/** A depth from which a groove is no longer smooth, as a share of the bar. */
const grooved = 0.15

/** A groove that nobody says a word of the edge of may have a sharp one. */
const unfelt = { low: 0, central: 0, high: 1 }

function toGrooveEdge(found: FindingInput, part: PartInput, picker: Picker): EdgeClass {
  const isDeep = found.kind === 'groove' && (toDepthShare(found, part)?.central ?? 0) >= grooved
  const byDepth = isDeep ? 'rounded' : 'smooth'
  if (found.edge !== null) return worse(found.edge, byDepth)
  if (part.findings.some(other => other.kind === 'no_fault')) return byDepth
  return picker.pickBetween('edge.unfelt', unfelt) > 0 ? 'sharp' : byDepth
}

/** Edges at the hanger's end are met only where a draw is turned round: one class blunter than they feel. */
const blunter = (edge: EdgeClass): EdgeClass => edgeClasses[Math.max(0, edgeClasses.indexOf(edge) - 1)]!

function toFoundEdge(found: FindingInput, part: PartInput, picker: Picker): EdgeClass | null {
  switch (found.kind) {
    case 'groove':
    case 'section_lost':
      return toGrooveEdge(found, part, picker)
    case 'sharp_edge_rope':
    case 'nicked':
    case 'rope_over_edge':
      return found.edge ?? 'sharp'
    case 'sharp_edge_hanger':
      return part.kind === 'hanger' ? null : blunter(found.edge ?? 'sharp')
    default:
      return null
  }
}

/**
 * The edge class of a part from what people give: smooth without a word of an edge and under 15 % of the bar, rounded
 * from there, else as felt; the worst of several. Null where no rope runs.
 */
export function chooseEdge(part: PartInput, picker: Picker): EdgeClass | null {
  const found = part.findings.flatMap(finding => toFoundEdge(finding, part, picker) ?? [])
  if (found.length > 0) return found.reduce(worse)
  return ropeParts.includes(part.kind) ? 'smooth' : null
}

/** Parts left hanging at a bolt, which the rope itself runs through. */
const hangingParts: readonly PartKind[] = [
  'connector',
  'fixed_draw',
  'quick_link',
  'ring',
  'sling',
  'cord',
  'swivel',
  'chain',
  'lower_off_hook',
  'cold_shut',
]

/** Whether the rope runs over a part: at a bolt only over what stays hanging there, since climbers bring their own draw. */
function isRunOver(part: PartInput, atStation: boolean): boolean {
  const has = (kind: string) => part.findings.some(found => found.kind === kind)
  if (has('rope_over_edge')) return true
  if (!atStation) return hangingParts.includes(part.kind)
  return part.kind === 'hanger' ? has('sharp_edge_rope') : true
}

/** The sharpest edge that the rope runs over at a bolt or a station, or null. */
export function findEdge(parts: readonly PartInput[], atStation: boolean, picker: Picker): EdgeClass | null {
  const edges = parts.flatMap(part => (isRunOver(part, atStation) ? (chooseEdge(part, picker) ?? []) : []))
  return edges.length === 0 ? null : edges.reduce(worse)
}

/** The chance that an edge is the class found, or one worse. */
function listPossible(edge: EdgeClass, picker: Picker): { edge: EdgeClass; chance: number }[] {
  const next = edgeClasses[edgeClasses.indexOf(edge) + 1]
  if (next === undefined) return [{ edge, chance: 1 }]
  const chance = picker.pick('edge.worse')
  return [
    { edge, chance: 1 - chance },
    { edge: next, chance },
  ]
}

/** The chance that a fall of such a load cuts the rope over an edge: grows with the cube of the load, 4 kN as measured. */
export function toCutPerFall(edge: EdgeClass, load: Lognormal, picker: Picker): number {
  const cubes = toMeanCube(load) / 4 ** 3
  return listPossible(edge, picker).reduce(
    (sum, { edge, chance }) => sum + chance * Math.min(1, picker.pick(`cut.fall.${edge}`) * cubes),
    0,
  )
}

/** The chance that one lowering cuts the rope over an edge. */
export function toCutPerLowering(edge: EdgeClass, picker: Picker): number {
  return listPossible(edge, picker).reduce(
    (sum, { edge, chance }) => sum + chance * picker.pick(`cut.lowering.${edge}`),
    0,
  )
}
