import type { AnchorKind } from '~/crags/anchor'
import type { Traffic } from '~/crags/crag'
import type { Material, PartKind } from '~/crags/part'
import { evaluate } from '~/rating/evaluate'
import type { FindingKind } from '~/rating/finding'
import type { FindingInput, PartInput, RatingInputs } from '~/rating/inputs'
import { modelRows, toModel } from '~/rating/model'
import { createPicker } from '~/rating/picker'
import { rate } from '~/rating/rate'

const model = toModel(modelRows)

/** A finding as people give it: mostly without a measure. */
export function found(kind: FindingKind, given: Partial<FindingInput> = {}): FindingInput {
  return { kind, low: null, high: null, unit: null, edge: null, triedByHand: null, ...given }
}

/** A part as people give it: by picture, its material and age often unknown. */
export function part(kind: PartKind, findings: FindingInput[], given: Partial<PartInput> = {}): PartInput {
  return {
    id: given.id ?? `${kind}-${given.side ?? ''}`,
    kind,
    material: 'unknown',
    sizeMm: null,
    ageYears: null,
    side: null,
    findings,
    ...given,
  }
}

/** A steady route of 20 m with nine bolts and a lower-off, the parts standing at bolt `bolt` (10 is the lower-off). */
export function at(
  bolt: number,
  parts: PartInput[],
  given: {
    traffic?: Traffic
    crux?: RatingInputs['crux']
    sea?: boolean
    ledges?: number[]
    otherSide?: RatingInputs['otherSide']
    kind?: AnchorKind
    abseil?: boolean
    spacing?: number
  } = {},
): RatingInputs {
  const spacing = given.spacing ?? 2
  const points = Array.from({ length: 10 }, (_, i) => ({
    kind: (i === 9 ? 'lower_off' : 'bolt') as AnchorKind,
    alongM: i === 9 ? 20 : 2.2 + i * spacing,
    assumed: true,
    state: 'good' as const,
  }))
  if (given.kind) points[bolt - 1]!.kind = given.kind
  const station = bolt === 10
  return {
    climb: {
      lengthM: 20,
      traffic: given.traffic ?? 'steady',
      ascentsPerYear: null,
      start: 'ground',
      below: 'ground',
      ledges: (given.ledges ?? []).map(atM => ({ atM })),
      points,
    },
    at: bolt - 1,
    crux: given.crux ?? 'ordinary',
    parts,
    place: { seaKm: given.sea ? 0.05 : 20, warmSea: given.sea ?? false, corrosivity: null },
    otherSide: given.otherSide ?? null,
    usedFor: { lowering: station, toprope: station, abseil: given.abseil ?? false },
  }
}

export const lowerOff = 10
export const sound = [found('no_fault')]

/** Two glue-in eyes looked at and sound, and what hangs from both. */
export function hangingFromTwo(shared: PartInput, material: Material = 'stainless'): PartInput[] {
  return [
    part('bonded_eye', sound, { side: 'a', id: 'a', material, ageYears: 8 }),
    part('bonded_eye', sound, { side: 'b', id: 'b', material, ageYears: 8 }),
    shared,
  ]
}

/** R a year of a case with every number of the first model central, without the runs for its range. */
export const centralRate = (inputs: RatingInputs) => evaluate(inputs, createPicker(model)).rate

/** The rating of a case with the first model. */
export const rated = (inputs: RatingInputs) => rate(inputs, model)
