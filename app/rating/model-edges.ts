import { edgeClasses } from './finding'
import type { ModelRow } from './model'
import { around, row } from './model-row'

const perFall = [1e-12, 3e-9, 1e-5, 1e-4, 3e-3]
const perLowering = [1e-12, 2e-8, 5e-7, 4e-6, 2e-4]
const tests = { source: 'order from published tests of worn edges', unit: 'an event' }

/** How often an edge cuts the rope: in a fall at 4 kN (growing with the cube of the load), and in a lowering. */
export const cutRows: readonly ModelRow[] = [
  ...edgeClasses.flatMap((edge, i) => [
    around(`cut.fall.${edge}`, perFall[i]!, 1 / 5, 5, tests),
    around(`cut.lowering.${edge}`, perLowering[i]!, 1 / 5, 5, tests),
  ]),
  row('edge.worse', 0.01, 0.03, 0.1, { unit: 'chance that an edge is one class worse' }),
]

/** How often a part lets the rope out: by handling, hang and fall; and how two sides of a station hang together. */
export const releaseRows: readonly ModelRow[] = [
  ...(
    [
      ['gate', 1e-6, 1e-5, 1e-4],
      ['unscrewed', 1e-6, 1e-5, 3e-5],
      ['nose', 1e-5, 1e-3, 1e-2],
      ['open_hook', 1e-7, 2e-6, 1e-4],
      ['worn_hook', 1e-6, 2e-5, 1e-3],
      ['rotation', 1e-8, 1e-7, 1e-5],
    ] as const
  ).flatMap(([name, handling, hang, fall]) => [
    around(`release.${name}.handling`, handling * 0.1, 1 / 5, 5, { unit: 'an event' }),
    around(`release.${name}.hang`, hang, 1 / 5, 5, { unit: 'an event' }),
    around(`release.${name}.fall`, fall, 1 / 5, 5, { unit: 'an event' }),
  ]),
  row('common.looked_at', 0.002, 0.01, 0.05, { unit: 'share with one cause' }),
  row('common.not_looked_at', 0.01, 0.05, 0.2, { unit: 'share with one cause' }),
  row('common.both_bad', 0.05, 0.1, 0.3, { unit: 'share with one cause' }),
  row('shock', 1, 1.3, 2, { unit: 'factor on the side that is left' }),
]
