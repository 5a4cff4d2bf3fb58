import type { ModelRow } from './model'
import { around, fixed, row } from './model-row'

const practice = { mark: 'prac', source: 'common practice' }

/** Rope, body, belay, and the loads of events that are not falls on the line (kN, medians with ζ). */
export const loadRows: readonly ModelRow[] = [
  row('r', 0.6, 2 / 3, 0.75, { ...practice, unit: 'tension ratio' }),
  fixed('rope.force', 9, { unit: 'kN', source: 'EN 892, a usual single rope' }),
  fixed('rope.zeta', 0.08),
  fixed('mass', 75, { unit: 'kg' }),
  fixed('mass.zeta', 0.18),
  row('slack', 0.3, 0.6, 1, { unit: 'm' }),
  fixed('slack.zeta', 0.6),
  row('body', 0.45, 0.55, 0.75, { source: 'fitted to published gym falls: mean 3.54, maximum 4.78 kN' }),
  fixed('body.zeta', 0.15),
  fixed('brake.soft', 2.2, { unit: 'kN', mark: 'mem' }),
  fixed('brake.firm', 3, { unit: 'kN', mark: 'mem' }),
  row('brake', 0.8, 1, 1.3, { mark: 'mem', unit: 'factor' }),
  fixed('brake.zeta', 0.2),
  fixed('feet', 1, { unit: 'm below the tie-in' }),
  ...(
    [
      ['lowering', 1.4, 0.23],
      ['abseil', 1, 0.25],
      ['toprope', 2.2, 0.3],
      ['static', 4, 0.35],
      ['belay_hang', 1.2, 0.3],
      ['belay_fall', 5, 0.3],
      ['handling', 0.1, 0.7],
    ] as const
  ).flatMap(([name, median, zeta]) => [
    fixed(`load.${name}`, median, { unit: 'kN' }),
    fixed(`load.${name}.zeta`, zeta),
  ]),
]

/** How often: ascents a year by class of traffic, events an ascent. */
export const eventRows: readonly ModelRow[] = [
  around('ascents.quiet', 20, 0.5, 2, { unit: 'a year' }),
  around('ascents.steady', 100, 0.5, 2, { unit: 'a year' }),
  around('ascents.busy', 400, 0.5, 2, { unit: 'a year' }),
  around('ascents.groups', 1500, 0.5, 2, { unit: 'a year' }),
  row('ascents.counted', 0.8, 1, 1.25, { unit: 'factor' }),
  ...(
    [
      ['bolt1', 0.005, 0.02],
      ['bolt2', 0.01, 0.05],
      ['other', 0.03, 0.1],
      ['crux', 0.3, 0.5],
      ['much', 0.5, 1],
    ] as const
  ).flatMap(([name, falls, hangs]) => [
    around(`falls.${name}`, falls, 1 / 3, 3, { unit: 'an ascent' }),
    fixed(`hangs.${name}`, hangs, { unit: 'an ascent' }),
  ]),
  fixed('handling.bolt', 2, { unit: 'an ascent' }),
  fixed('handling.lower_off', 4, { unit: 'an ascent' }),
  fixed('lowerings', 1.5, { unit: 'an ascent' }),
  fixed('toprope_falls', 0.3, { unit: 'an ascent' }),
  fixed('static.lower_off', 0.002, { unit: 'an ascent' }),
  fixed('static.bolt', 0.0002, { unit: 'an ascent' }),
  fixed('abseils', 1, { unit: 'an ascent' }),
  fixed('belay.hangs', 1.2, { unit: 'an ascent' }),
  fixed('belay.falls', 0.0005, { unit: 'an ascent' }),
  row('avoided', 0.005, 0.02, 0.1, { unit: 'factor on the rate of a fault that is seen' }),
]
