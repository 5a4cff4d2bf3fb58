import type { Below } from '../anchor'
import type { ConditionState } from '../condition-state'
import { conditionShort } from '../condition-state'
import type { DrawnPoint } from '../drawn-point'
import { type LineScale, spreadLabels, toY } from '../line-layout'
import { MarkAt } from './condition-mark'
import { Ground, LineScene } from './line-scene'

const width = 358
const centre = 104
const rock = 44
/** a thumb's height */
const row = 46

const weights: Record<ConditionState, number> = { severe: 600, poor: 600, fair: 600, unknown: 600, good: 400 }

/**
 * The line of a route to choose one point on: the drawing, and beside each mark its name as a choice a thumb can hit.
 * Plain radio buttons of a form, named `point`.
 */
export function LineChooser(props: { lengthM: number; points: DrawnPoint[]; ground: Below }) {
  const { lengthM, points } = props
  const height = Math.max(480, points.length * row + 70)
  const scale: LineScale = { lengthM, base: height - 34, perMetre: (height - 80) / Math.max(lengthM, 1) }
  const labels = spreadLabels(
    points.map(point => toY(scale, point.alongM)),
    { gap: row, top: 26, bottom: scale.base - 18 },
  )
  return (
    <fieldset>
      <legend className="sr-only">The fixed points of the route, from the ground up</legend>
      {/* biome-ignore lint/a11y/useSemanticElements: an SVG has no element for a group of controls */}
      <svg
        viewBox={`0 0 ${width} ${height}`}
        className="block h-auto w-full max-w-[560px]"
        aria-label="The line of the route"
        role="group"
      >
        <LineScene
          id="chooser"
          scale={scale}
          centre={centre}
          rock={rock}
          assumed={points.some(point => point.assumed)}
        />
        <path
          d={`M${centre} ${toY(scale, 0)}V${toY(scale, lengthM)}`}
          stroke="var(--slate)"
          strokeWidth={2.5}
        />
        <Ground ground={props.ground} scale={scale} from={centre - rock / 2 - 20} to={width - 4} />
        {points.map((point, index) => {
          const y = toY(scale, point.alongM)
          const lowerOff = point.kind === 'lower_off'
          const size = lowerOff ? 22 : 18
          return (
            <g key={point.code}>
              <circle cx={centre} cy={y} r={size / 2 + 3} fill="var(--chalk)" />
              <MarkAt state={point.state} x={centre} y={y} size={size} />
              {lowerOff && (
                <path d={`M${centre - 10} ${y + size / 2 + 5}h20`} stroke="var(--slate)" strokeWidth={2.5} />
              )}
              <path
                d={`M${centre + rock / 2 + 2} ${y}L${centre + rock / 2 + 8} ${labels[index]}`}
                stroke="var(--stone)"
                opacity={0.5}
              />
              <foreignObject
                x={centre + rock / 2 + 8}
                y={labels[index]! - row / 2}
                width={width - centre - rock / 2 - 8}
                height={row}
              >
                <label className="line-choice">
                  <input type="radio" name="point" value={point.code} />
                  <span className={weights[point.state] === 600 ? 'font-semibold' : ''}>{point.name}</span>
                  {point.state !== 'good' && <span className="line-choice-what">{toQuiet(point)}</span>}
                </label>
              </foreignObject>
            </g>
          )
        })}
      </svg>
    </fieldset>
  )
}

const toQuiet = (point: DrawnPoint) =>
  point.state === 'unknown' ? point.what.split(',')[0] : conditionShort[point.state].toLowerCase()
