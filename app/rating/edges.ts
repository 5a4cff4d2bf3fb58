import { type EdgeClass, edgeClasses } from './finding'
import type { FindingInput, PartInput } from './inputs'
import { type Lognormal, toMeanCube } from './lognormal'
import type { Picker } from './picker'

/** Parts the rope itself runs over. */
const ropeParts = [
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

/** The middle of a measure, or null when nobody gave one. */
export function toMiddle(found: Pick<FindingInput, 'low' | 'high'>): number | null {
  const { low, high } = found
  return low === null ? high : high === null ? low : (low + high) / 2
}

/** How deep a groove is as a share of the bar; a bar nobody measured counts as 10 mm. */
export function toDepthShare(found: FindingInput, part: Pick<PartInput, 'sizeMm'>): number | null {
  const middle = toMiddle(found)
  if (middle === null) return null
  return found.unit === 'percent' ? middle / 100 : middle / (part.sizeMm ?? 10)
}

function toFoundEdge(found: FindingInput, part: PartInput): EdgeClass | null {
  if (found.kind === 'groove' || found.kind === 'section_lost') {
    if (found.edge !== null) return found.edge
    return (toDepthShare(found, part) ?? 0) >= 0.15 ? 'rounded' : 'smooth'
  }
  if (found.kind === 'sharp_edge_rope') return found.edge ?? 'sharp'
  if (found.kind === 'nicked') return found.edge ?? 'sharp'
  if (found.kind === 'rope_over_edge') return found.edge ?? 'sharp'
  return null
}

/**
 * The edge class of a part from what people give: smooth without a word of an edge and under 15 % of the bar, rounded
 * from there, else as felt; the worst of several. Null where no rope runs.
 */
export function chooseEdge(part: PartInput): EdgeClass | null {
  const found = part.findings.flatMap(finding => toFoundEdge(finding, part) ?? [])
  if (found.length > 0) return found.reduce(worse)
  return ropeParts.includes(part.kind) ? 'smooth' : null
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
