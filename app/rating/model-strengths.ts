import type { ModelRow } from './model'
import { around, fixed, row } from './model-row'

const published = { mark: 'std', source: 'published proportion of failures' }

/** Median strengths in kN with ζ: sound, weak, bad. */
const populations = {
  expansion: [32, 0.12, 14, 0.3, 3.5, 0.5],
  bonded: [38, 0.12, 15, 0.3, 3.5, 0.5],
  hanger: [30, 0.08, 14, 0.3, 4, 0.5],
  ring: [45, 0.15, 16, 0.3, 5, 0.5],
  chain: [40, 0.12, 15, 0.3, 5, 0.5],
  quick_link: [32, 0.1, 14, 0.3, 4, 0.5],
  steel_connector: [27, 0.08, 11, 0.25, 3.5, 0.5],
  aluminium_connector: [24, 0.08, 9, 0.25, 2.5, 0.5],
  sling: [24, 0.12, 10, 0.3, 2.5, 0.5],
  peg: [12, 0.4, 6, 0.5, 1.5, 0.7],
  thread: [18, 0.3, 8, 0.4, 2.5, 0.6],
  cracking: [30, 0.12, 10, 0.35, 2.5, 0.6],
} as const
export type Population = keyof typeof populations

export const strengthRows: readonly ModelRow[] = [
  ...Object.entries(populations).flatMap(([name, [sound, soundZeta, weak, weakZeta, bad, badZeta]]) => [
    fixed(`strength.${name}.sound`, sound, { unit: 'kN' }),
    fixed(`strength.${name}.sound.zeta`, soundZeta),
    fixed(`strength.${name}.weak`, weak, { unit: 'kN' }),
    fixed(`strength.${name}.weak.zeta`, weakZeta),
    fixed(`strength.${name}.bad`, bad, { unit: 'kN' }),
    fixed(`strength.${name}.bad.zeta`, badZeta),
  ]),
  row('strength.factor', 0.85, 1, 1.15, { unit: 'factor on sound and weak' }),
  row('strength.bad.factor', 0.7, 1, 1.3, { unit: 'factor on bad' }),
  fixed('cap.gate_open', 7.5, { unit: 'kN', source: 'EN 12275: at least 7', mark: 'prac' }),
  fixed('cap.cross_loaded', 7.8, { unit: 'kN', source: 'EN 12275: at least 7', mark: 'prac' }),
  fixed('cap.nose_hooked', 2, { unit: 'kN', mark: 'prac', source: 'common practice' }),
]

/** Weights of weak and bad by what is known of the part; the ranges are factors. */
const weights: readonly [name: string, weak: number, bad: number, badDown?: number, badUp?: number][] = [
  ['new', 1e-5, 5e-8],
  ['good', 5e-5, 2e-7],
  ['fair', 3e-3, 1e-5],
  ['poor', 0.05, 5e-4],
  ['severe', 0.3, 0.03],
  ['old_plated', 0.03, 3e-5],
  ['unknown_age', 0.03, 1.2e-4, 0.1, 20],
  ['self_drilled', 0.3, 8e-3],
  ['rust1', 7e-5, 2.5e-7],
  ['rust2', 1e-4, 3.5e-7],
  ['rust3', 3e-3, 2e-5],
  ['rust4', 0.05, 5e-4],
  ['rust5', 0.3, 0.01],
  ['spins', 2e-3, 3e-5],
  ['nut_loose', 0.01, 3e-4],
  ['loose_in_hole', 0.15, 0.03],
  ['bent', 0.05, 3e-4],
  ['rock_hollow', 0.1, 3e-3],
  ['rock_cracked', 0.05, 2e-3],
  ['hanger_cracked', 0.4, 0.2],
  ['resin_gap', 0.03, 1e-4],
  ['turns', 0.3, 0.1],
  ['resin_soft', 0.3, 0.3],
  ['sling_faded', 0.3, 0.01],
  ['sling_stiff', 0.5, 0.1],
  ['sling_unknown', 0.3, 5e-3, 0.1, 10],
  ['peg_unknown', 0.3, 0.05, 0.2, 4],
  ['peg_loose', 0.3, 0.35],
  ['link_unscrewed', 0.3, 3e-3],
  ['cracking_possible', 0.01, 5e-4, 1 / 20, 60],
  ['cracking_spots', 0.05, 7e-3, 1 / 15, 25],
  ['cracking_known', 0.1, 0.15, 1 / 5, 1.5],
]

export const weightRows: readonly ModelRow[] = weights.flatMap(([name, weak, bad, down, up]) => [
  around(`weight.${name}.weak`, weak, 1 / 3, 3),
  around(`weight.${name}.bad`, bad, down ?? 1 / 5, up ?? 5, name.startsWith('cracking') ? published : {}),
])
