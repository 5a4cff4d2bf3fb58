import { renderToStaticMarkup } from 'react-dom/server'
import { MemoryRouter } from 'react-router'
import { describe, expect, it } from 'vitest'
import { ConditionMark } from '~/crags/components/condition-mark'
import { ConditionsBar } from '~/crags/components/conditions-bar'
import { Line } from '~/crags/components/line'
import { LineChooser } from '~/crags/components/line-chooser'
import { Strip } from '~/crags/components/strip'
import { conditionStates } from '~/crags/condition-state'
import type { DrawnPoint } from '~/crags/drawn-point'
import { spreadLabels } from '~/crags/line-layout'

const point = (name: string, alongM: number, given: Partial<DrawnPoint> = {}): DrawnPoint => ({
  code: `KC${name.replace(/\W/g, '').toUpperCase().padEnd(5, 'X').slice(0, 5)}`,
  name,
  kind: 'bolt',
  alongM,
  assumed: false,
  state: 'good',
  what: 'glue-in, 2014',
  seen: '2 Apr 2027, on it',
  open: false,
  ...given,
})
const points = [
  point('Bolt 1', 2.1),
  point('Bolt 2', 3.9, { state: 'poor', what: 'nut loose' }),
  point('Lower-off', 12, { kind: 'lower_off' }),
]

const draw = (given: Partial<Parameters<typeof Line>[0]> = {}) =>
  renderToStaticMarkup(
    <MemoryRouter>
      <Line
        lengthM={12}
        points={points}
        zones={[
          { fromM: 0, toM: 2.1, kind: 'anyway' },
          { fromM: 2.1, toM: 3.9, kind: 'hatched' },
        ]}
        ledges={[]}
        ground="ground"
        href={code => `?point=${code}`}
        {...given}
      />
    </MemoryRouter>,
  )

describe('Condition marks', () => {
  it('tell every condition by a shape of its own', () => {
    const shapes = conditionStates.map(state =>
      renderToStaticMarkup(<ConditionMark state={state} size={16} decorative />).replace(
        /var\(--[\w-]+\)/g,
        '',
      ),
    )
    expect(new Set(shapes).size).toBe(conditionStates.length)
  })

  it('name the condition unless its word stands beside', () => {
    expect(renderToStaticMarkup(<ConditionMark state="severe" size={16} />)).toContain(
      'aria-label="Do not rely on it"',
    )
    expect(renderToStaticMarkup(<ConditionMark state="severe" size={16} decorative />)).not.toContain(
      'aria-label',
    )
  })
})

describe('The line', () => {
  it('leads from every fixed point to its own part of the page, named with height and condition', () => {
    expect(draw()).toContain('aria-label="Bolt 2, 3.9 m, Suspect, nut loose"')
  })

  it('says what hatched and dotted stretches mean', () => {
    expect(draw()).toContain('a fall from here reaches the ground if the bolt below fails')
    expect(draw()).toContain('reaches the ground anyway')
    expect(draw({ zones: [] })).not.toContain('reaches the ground')
  })

  it('says once that spacing is assumed where nobody measured it', () => {
    const assumed = points.map(one => ({ ...one, assumed: true }))
    expect(draw({ points: assumed }).match(/it is assumed/g)).toHaveLength(1)
    expect(draw()).not.toContain('it is assumed')
  })

  it('names ledges and what is below', () => {
    expect(draw({ ledges: [{ atM: 6.5 }] })).toContain('ledge at 6.5 m')
    expect(draw({ ground: 'sea' })).toContain('>sea<')
  })

  it('is chosen from by plain radio buttons', () => {
    const html = renderToStaticMarkup(<LineChooser lengthM={12} points={points} ground="ground" />)
    expect(html.match(/type="radio"/g)).toHaveLength(points.length)
  })

  it('and its kin carry no inline style, which the content policy forbids', () => {
    const all = [
      draw(),
      renderToStaticMarkup(<LineChooser lengthM={12} points={points} ground="ground" />),
      renderToStaticMarkup(<Strip points={[{ along: 0.2, state: 'poor', current: true }]} />),
      renderToStaticMarkup(<ConditionsBar counts={{ severe: 1, poor: 0, fair: 2, unknown: 3, good: 4 }} />),
    ].join('')
    expect(all).not.toMatch(/\sstyle=/)
  })
})

describe('Labels along a line', () => {
  const bounds = { gap: 27, top: 20, bottom: 700 }

  it('stand where their points are when there is room', () => {
    expect(spreadLabels([600, 400, 200], bounds)).toEqual([600, 400, 200])
  })

  it('never overlap, keep their order and stay on the sheet, however close the points', () => {
    let state = 3
    const random = () => {
      state = (state * 16807) % 2147483647
      return state / 2147483647
    }
    for (let round = 0; round < 300; round++) {
      const count = 1 + Math.floor(random() * 20)
      const wanted = Array.from({ length: count }, () => 30 + random() * 660).sort((a, b) => b - a)
      const placed = spreadLabels(wanted, bounds)
      for (let i = 1; i < placed.length; i++)
        expect(placed[i - 1]! - placed[i]!).toBeGreaterThanOrEqual(27 - 1e-6)
      expect(Math.min(...placed)).toBeGreaterThanOrEqual(20 - 1e-6)
    }
  })
})
