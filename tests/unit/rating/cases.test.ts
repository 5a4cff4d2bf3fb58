import { describe, expect, it } from 'vitest'
import type { Band } from '~/rating/band'
import type { RatingInputs } from '~/rating/inputs'
import { at, found, hangingFromTwo, lowerOff, part, rated, sound } from './case'

/** the middle one of nine */
const mid = 5
const third = { low: 3.3, high: 3.3, unit: 'mm' } as const
const bolt = (findings: Parameters<typeof part>[1]) => [part('wedge_bolt', findings), part('hanger', [])]
const glue = (findings: Parameters<typeof part>[1]) => [part('bonded_eye', findings)]
const connector = (findings: Parameters<typeof part>[1]) => [
  part('bonded_eye', sound, { ageYears: 6 }),
  part('connector', findings, { ageYears: 6 }),
]
const both = (a: Parameters<typeof part>[1], b: Parameters<typeof part>[1]) => [
  part('bonded_eye', a, { side: 'a', id: 'a' }),
  part('bonded_eye', b, { side: 'b', id: 'b' }),
]
const rust = (grade: number) => found('rust', { low: grade, high: grade, unit: 'grade' })
const chained = (a: Parameters<typeof part>[1]) => [
  ...both(sound, sound),
  part('chain', a, { side: 'a', id: 'chain-a' }),
  part('chain', [], { side: 'b', id: 'chain-b' }),
]
const ring = (findings: Parameters<typeof part>[1]) =>
  hangingFromTwo(part('ring', findings, { sizeMm: 10, ageYears: 8 }))

const cases: [want: Band | Band[], title: string, inputs: RatingInputs][] = [
  [
    'first',
    'a bonded bolt that turns, bolt 2, busy',
    at(2, glue([found('turns_by_hand')]), { traffic: 'busy' }),
  ],
  ['first', 'a stud loose in its hole, bolt 3', at(3, bolt([found('loose_in_hole')]))],
  ['first', 'soft resin, bolt 3', at(3, glue([found('resin_soft')]))],
  ['first', 'rust all over, bolt 3', at(3, bolt([found('rust', { low: 5, high: 5, unit: 'grade' })]))],
  ['first', 'a cracked hanger, bolt 3', at(3, [part('wedge_bolt', []), part('hanger', [found('cracked')])])],
  [['first', 'soon'], 'a hanger missing at bolt 2', at(2, bolt([found('missing')]))],
  [
    'first',
    'a sharp groove on the crux bolt’s fixed connector',
    at(5, connector([found('groove', { edge: 'sharp' })]), { crux: 'crux' }),
  ],
  ['first', 'a knife edge there', at(5, connector([found('groove', { edge: 'knife' })]), { crux: 'crux' })],
  [
    'first',
    'a lower-off ring worn a third, sharp, busy',
    at(lowerOff, ring([found('groove', { ...third, edge: 'sharp' })]), { traffic: 'busy' }),
  ],
  [
    ['first', 'soon'],
    'the same on a steady route',
    at(lowerOff, ring([found('groove', { ...third, edge: 'sharp' })])),
  ],
  [
    'first',
    'both sides of a two-point lower-off turning',
    at(lowerOff, both([found('turns_by_hand')], [found('turns_by_hand')]), { otherSide: 'both_bad' }),
  ],
  [
    'first',
    'one side turns, the other not looked at',
    at(lowerOff, both([found('turns_by_hand')], []), { otherSide: 'not_looked_at' }),
  ],
  [
    'first',
    'a quick link unscrewed at a lower-off',
    at(lowerOff, hangingFromTwo(part('quick_link', [found('link_unscrewed')]))),
  ],
  ['first', 'faded cord the only lower-off', at(lowerOff, [part('cord', [found('fabric_faded')])])],
  ['first', 'a connector hooked by its nose', at(5, connector([found('nose_hooked')]))],
  [
    'first',
    'a worn open hook, busy',
    at(lowerOff, hangingFromTwo(part('lower_off_hook', [found('hook_worn')])), { traffic: 'busy' }),
  ],
  ['first', 'a self-drilled bolt 2, busy', at(2, [part('self_drilled', [])], { traffic: 'busy' })],
  ['first', 'a loose peg', at(3, [part('peg', [found('loose_in_hole')])], { kind: 'peg' })],
  ['first', 'bolt 8 turning above a ledge', at(8, glue([found('turns_by_hand')]), { ledges: [11.5] })],
  [
    'first',
    'stainless by a warm sea with rust spots, bolt 2',
    at(
      2,
      [part('bonded_eye', [found('rust', { low: 2, high: 2, unit: 'grade' })], { material: 'stainless' })],
      { sea: true },
    ),
  ],

  [
    'soon',
    'a connector with a felt edge on a much-fallen-on bolt',
    at(5, connector([found('groove', { edge: 'felt' })]), { crux: 'much_fallen_on' }),
  ],
  [
    'soon',
    'one side turns, the other looked at and sound',
    at(lowerOff, both([found('turns_by_hand')], sound), { otherSide: 'looked_at' }),
  ],
  [
    'soon',
    'a bonded bolt that turns, bolt 6, quiet',
    at(6, glue([found('turns_by_hand')]), { traffic: 'quiet' }),
  ],
  ['soon', 'a loose nut, bolt 3', at(3, bolt([found('nut_loose')]))],
  [['soon', 'turn'], 'a hanger missing mid-route', at(mid, bolt([found('missing')]))],
  ['soon', 'a gate stuck open, mid-route', at(mid, connector([found('gate_stuck')]))],
  ['soon', 'a connector cross-loaded', at(mid, connector([found('cross_loaded')]))],
  [
    'soon',
    'a hook with its keeper gone',
    at(lowerOff, hangingFromTwo(part('lower_off_hook', [found('keeper_gone')]))),
  ],
  [
    'soon',
    'cord of unknown age on one side of a lower-off',
    at(lowerOff, [...both([], []), part('cord', [], { side: 'a', id: 'cord' })], {
      otherSide: 'not_looked_at',
    }),
  ],
  [
    'soon',
    'a single-point lower-off of unknown age',
    at(lowerOff, [part('wedge_bolt', [found('single_point')]), part('ring', [])]),
  ],
  ['soon', 'a first bolt at 2 m that is loose', at(1, bolt([found('loose_in_hole')]))],
  [
    'soon',
    'a faded sling on a fixed draw',
    at(5, [part('bonded_eye', sound, { ageYears: 6 }), part('sling', [found('fabric_faded')])]),
  ],
  [
    ['soon', 'turn'],
    'a hanger missing mid-route between close bolts',
    at(mid, bolt([found('missing')]), { spacing: 1.2 }),
  ],
  [
    'soon',
    'stainless by a warm sea with rust spots, mid-route',
    at(mid, [part('bonded_eye', [rust(2)])], { sea: true }),
  ],
  [
    'soon',
    'stainless by a warm sea with rust spots on one side of a lower-off',
    at(lowerOff, both([rust(2)], []), { sea: true, otherSide: 'not_looked_at' }),
  ],
  [
    'soon',
    'a self-drilled bolt by the sea, mid-route',
    at(mid, [part('self_drilled', []), part('hanger', [])], { sea: true }),
  ],
  [
    'soon',
    'a rope run over a hanger’s edge when abseiling',
    {
      ...at(
        lowerOff,
        [
          ...both(sound, sound),
          part('hanger', [found('rope_over_edge')], { side: 'a', id: 'hanger-a' }),
          part('hanger', [], { side: 'b', id: 'hanger-b' }),
        ],
        { kind: 'abseil_station', otherSide: 'looked_at' },
      ),
      usedFor: { lowering: false, abseil: true, toprope: false },
    },
  ],
  [
    'soon',
    'a belay with one of two bolts loose in its hole',
    at(lowerOff, both([found('loose_in_hole')], []), { kind: 'stance', otherSide: 'not_looked_at' }),
  ],
  [
    ['first', 'soon'],
    'a rusty peg, the sole protection on a sea cliff',
    at(1, [part('peg', [rust(4)])], { kind: 'peg', sea: true, traffic: 'quiet' }),
  ],

  [
    'turn',
    'a nut that is finger-tight on a sound stud, bolt 3',
    at(3, bolt([found('nut_loose'), found('no_fault')])),
  ],
  [
    'turn',
    'flaking rust on one leg of a chain',
    at(lowerOff, chained([rust(4)]), { otherSide: 'not_looked_at' }),
  ],
  [
    'turn',
    'a ring worn a third, smooth and round',
    at(lowerOff, ring([found('groove', { ...third, edge: 'rounded' })])),
  ],
  [
    'turn',
    'a quick link worn a fifth, smooth',
    at(
      lowerOff,
      hangingFromTwo(
        part('quick_link', [found('groove', { low: 20, high: 20, unit: 'percent' })], { ageYears: 8 }),
      ),
    ),
  ],
  ['turn', 'flaking rust mid-route', at(mid, bolt([found('rust', { low: 4, high: 4, unit: 'grade' })]))],
  ['turn', 'unknown age, bolt 2', at(2, bolt([]))],
  ['turn', 'unknown age, bolt 5', at(5, bolt([]))],
  [
    'turn',
    'an old plated bolt, mid-route',
    at(mid, [part('wedge_bolt', [], { material: 'plated_steel', ageYears: 25 }), part('hanger', sound)]),
  ],
  ['turn', 'a gap in the resin, bolt 4', at(4, glue([found('resin_gap')]))],
  ['turn', 'a spinner at bolt 2', at(2, [part('wedge_bolt', sound), part('hanger', [found('spins')])])],
  ['turn', 'a bent bolt, bolt 6', at(6, bolt([found('bent')]))],
  [
    'turn',
    'a two-point lower-off of unknown age',
    at(lowerOff, both([], []), { otherSide: 'not_looked_at' }),
  ],
  [
    'turn',
    'an aluminium connector worn 15 %, smooth',
    at(5, [
      part('bonded_eye', sound, { ageYears: 6 }),
      part('connector', [found('groove', { low: 15, high: 15, unit: 'percent' })], {
        material: 'aluminium',
        ageYears: 6,
      }),
    ]),
  ],
  ['turn', 'a self-drilled bolt inland, mid-route', at(mid, [part('self_drilled', [])])],
  [
    'turn',
    'hidden cracking possible, nothing seen',
    at(mid, [part('bonded_eye', sound, { material: 'stainless', ageYears: 8 })], { sea: true }),
  ],
  [
    'turn',
    'a single-point lower-off in good order',
    at(lowerOff, [
      part('bonded_eye', [found('no_fault'), found('single_point')], { ageYears: 5 }),
      part('ring', sound, { ageYears: 5 }),
    ]),
  ],

  ['watch', 'a good bolt 2', at(2, [part('bonded_eye', sound, { ageYears: 8 })])],
  ['watch', 'a good bolt 8, busy', at(8, glue(sound), { traffic: 'busy' })],
  ['watch', 'patches of rust mid-route', at(mid, [part('wedge_bolt', [rust(3)], { ageYears: 8 })])],
  [
    'watch',
    'a plate hanger’s edge mid-route that has nicked nothing yet',
    at(mid, [part('wedge_bolt', sound), part('hanger', [found('sharp_edge_hanger')])]),
  ],
  [
    'watch',
    'a plate hanger sharp on the rope’s side mid-route, where the rope hangs in a draw',
    at(mid, [part('wedge_bolt', sound), part('hanger', [found('sharp_edge_rope')])]),
  ],
  ['watch', 'a new bolt 3', at(3, [part('bonded_eye', [], { ageYears: 0.5 })])],
  [
    'watch',
    'spots of rust inland',
    at(mid, [
      part('wedge_bolt', [found('no_fault'), found('rust', { low: 2, high: 2, unit: 'grade' })], {
        ageYears: 8,
      }),
    ]),
  ],
  [
    ['watch', 'turn'],
    'a spinner mid-route on a sound stud',
    at(mid, [part('wedge_bolt', sound), part('hanger', [found('spins')], { ageYears: 8 })]),
  ],
  [
    'watch',
    'a ring worn a tenth',
    at(lowerOff, ring([found('no_fault'), found('groove', { low: 1, high: 1, unit: 'mm' })])),
  ],
  [
    'watch',
    'titanium by the sea',
    at(3, [part('bonded_eye', sound, { material: 'titanium', ageYears: 8 })], { sea: true }),
  ],
  [
    'watch',
    'a two-point lower-off in good order, busy',
    at(lowerOff, ring(sound), { traffic: 'busy', otherSide: 'looked_at' }),
  ],
]

/** The line of the story: eight bolts and a lower-off at 18.5 m, climbed often, by a warm sea. */
const slackWater: RatingInputs = {
  climb: {
    lengthM: 18.5,
    traffic: 'busy',
    ascentsPerYear: null,
    start: 'ground',
    below: 'ground',
    ledges: [],
    points: [2.1, 3.9, 5.6, 7.6, 9.7, 11.9, 14, 16.3, 18.5].map((alongM, i) => ({
      kind: i === 8 ? 'lower_off' : 'bolt',
      alongM,
      assumed: false,
      state: 'unknown',
    })),
  },
  at: 8,
  crux: 'ordinary',
  parts: [],
  place: { seaKm: 0.1, warmSea: true, corrosivity: null },
  otherSide: null,
  usedFor: { lowering: true, abseil: false, toprope: true },
}
const groove = found('groove', { ...third, edge: 'sharp' })

describe('The rating of what people really report', () => {
  it.each(cases)('is %s for %s', (want, title, inputs) => {
    const got = rated(inputs)
    expect([want].flat(), `${title}: R ${got.rate.toExponential(2)}`).toContain(got.band)
  })

  it('is Mend first for a steel ring worn a third and sharp at the top of a busy line, because it cuts the rope', () => {
    const parts = hangingFromTwo(part('ring', [groove], { sizeMm: 10, material: 'steel' }))
    const got = rated({ ...slackWater, parts, otherSide: 'looked_at' })
    expect(got).toMatchObject({ band: 'first', worst: 'ground', deciding: 'cuts_rope' })
    expect(got.floors).toContain('33 % of the bar is worn away; such a part is replaced from 33 %')
    expect(got.lookNext).toBe('run a fingernail over the edge, and photograph it close')
  })

  it('is Mend first for the same ring when nothing else of the lower-off is on record', () => {
    expect(rated({ ...slackWater, parts: [part('ring', [groove])] }).band).toBe('first')
  })

  it('could be Mend first for bolt 2 of unknown age', () => {
    expect(rated(at(2, bolt([]))).bandHigh).toBe('first')
  })

  it('could be Mend first for stainless by a warm sea with rust spots', () => {
    expect(rated(at(mid, [part('bonded_eye', [rust(2)])], { sea: true })).bandHigh).toBe('first')
    const one = at(lowerOff, both([rust(2)], []), { sea: true, otherSide: 'not_looked_at' })
    expect(rated(one).bandHigh).toBe('first')
  })

  it('says of a nut on a sound stud that it is a five-minute job', () => {
    const got = rated(at(3, bolt([found('nut_loose'), found('no_fault')])))
    expect(got.lookNext).toBe('a spanner on the nut, five minutes')
  })

  it('is Mend soon and could be Mend first for a loose nut on the story’s bolt 3, which a spanner settles', () => {
    const parts = [
      part('wedge_bolt', [found('nut_loose')], { material: 'plated_steel', sizeMm: 10 }),
      part('hanger', [found('spins')], { material: 'plated_steel' }),
    ]
    const got = rated({ ...slackWater, at: 2, parts })
    expect(got).toMatchObject({ band: 'soon', bandHigh: 'first', worst: 'ground', deciding: 'pulls_out' })
    expect(got.lookNext).toBe('a spanner on the nut, five minutes')
    expect(got.reasons.map(({ words }) => words)).toContain('Age and maker not known')
  })

  it('is never harmless for a point of which nothing at all is on record', () => {
    expect(rated(at(2, []))).toMatchObject({ band: 'turn', bandHigh: 'first' })
    expect(rated({ ...slackWater, parts: [] }).band).toBe('soon')
  })

  it('holds a point by the sea whose stainless steel may crack unseen at In turn or above', () => {
    const got = rated(at(8, glue(sound), { sea: true, traffic: 'quiet' }))
    expect(got.floors).toEqual(['stainless steel by a warm sea may crack unseen'])
    expect(got.bandLow).toBe('turn')
  })

  it('is more urgent for a lower-off that has lost a side, and for one that has lost its only ring', () => {
    const whole = rated(at(lowerOff, both(sound, sound), { otherSide: 'looked_at' })).rate
    const side = rated(at(lowerOff, both(sound, [found('missing')]), { otherSide: 'looked_at' })).rate
    const all = rated(at(lowerOff, hangingFromTwo(part('ring', [found('missing')])))).rate
    expect(side).toBeGreaterThan(whole)
    expect(all).toBeGreaterThan(1e-3)
  })
})
