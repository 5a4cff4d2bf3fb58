interface Curve {
  medianKn: number
  zeta: number
}

const width = 560
const height = 150
const base = height - 26
const left = 20
const toX = (kn: number) => left + (kn * (width - left - 10)) / 20.6

/** The density of a lognormal at x kN. */
function density(x: number, { medianKn, zeta }: Curve): number {
  if (x <= 0) return 0
  const z = Math.log(x / medianKn) / zeta
  return Math.exp(-0.5 * z * z) / (x * zeta * Math.sqrt(2 * Math.PI))
}

const samples = Array.from({ length: 206 }, (_, i) => (i + 1) / 10)

function toPath(heights: number[], scale: number): string {
  return samples
    .map((kn, i) => `${i === 0 ? 'M' : 'L'}${toX(kn).toFixed(1)} ${(base - heights[i]! * scale).toFixed(1)}`)
    .join('')
}

/**
 * Load and strength drawn over each other in kilonewtons, each to its own height, with the overlap hatched: where a
 * strong load meets a weak part. The words beside say the same.
 */
export function OverlapChart(props: {
  load: Curve
  strength: (Curve & { weight: number })[]
  loadWords: string
}) {
  const load = samples.map(kn => density(kn, props.load))
  const strength = samples.map(kn =>
    props.strength.reduce((sum, part) => sum + part.weight * density(kn, part), 0),
  )
  const loadScale = 78 / Math.max(...load)
  const strengthScale = 50 / Math.max(...strength)
  const overlap = samples
    .map(
      (kn, i) =>
        `L${toX(kn).toFixed(1)} ${(base - Math.min(load[i]! * loadScale, strength[i]! * strengthScale)).toFixed(1)}`,
    )
    .join('')
  const peak = (heights: number[]) => samples[heights.indexOf(Math.max(...heights))]!
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      className="mt-2 block w-full"
      role="img"
      aria-label={toWords(props)}
    >
      <defs>
        <pattern
          id="overlap"
          width="7"
          height="7"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0v7" stroke="var(--oxide)" strokeWidth="1.5" />
        </pattern>
      </defs>
      <path d={`M${toX(0)} ${base}${overlap}L${toX(20.6)} ${base}Z`} fill="url(#overlap)" />
      <path d={toPath(load, loadScale)} fill="none" stroke="var(--slate)" strokeWidth="2" />
      <path
        d={toPath(strength, strengthScale)}
        fill="none"
        stroke="var(--slate)"
        strokeWidth="2"
        strokeDasharray="6 3"
      />
      <path d={`M${left} ${base}H${width - 10}`} stroke="var(--slate)" />
      {[0, 5, 10, 15, 20].map(kn => (
        <text key={kn} x={toX(kn)} y={height - 8} textAnchor="middle" fontSize="12" fill="var(--stone)">
          {kn === 20 ? '20 kN' : kn}
        </text>
      ))}
      <text x={toX(Math.min(peak(load) + 1.6, 12))} y={22} fontSize="13" fill="var(--slate)">
        {props.loadWords}
      </text>
      <text x={toX(Math.min(peak(strength) + 1, 15))} y={60} fontSize="13" fill="var(--slate)">
        strength as it is now
      </text>
    </svg>
  )
}

function toWords({ load, strength }: { load: Curve; strength: (Curve & { weight: number })[] }): string {
  const weak = strength
    .filter(part => part.weight >= 0.001)
    .map(part => `${Math.round(part.weight * 100)} % near ${part.medianKn.toFixed(0)} kN`)
  return `Load about ${load.medianKn.toFixed(1)} kN. Strength as it is now: ${weak.join(', ')}.`
}
