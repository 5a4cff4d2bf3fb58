/** A place on the island's own sheet: metres east and north of its middle. */
export type Metres = [east: number, north: number]

/** Points written as `east,north east,north …` in whole metres. */
export const traced = (points: string): Metres[] =>
  points
    .trim()
    .split(/\s+/)
    .map(point => point.split(',').map(Number) as Metres)

const between = (a: number, b: number, c: number, d: number, t: number) =>
  0.5 * (2 * b + (c - a) * t + (2 * a - 5 * b + 4 * c - d) * t * t + (3 * b - a - 3 * c + d) * t * t * t)

/** A smooth curve through all the points (Catmull-Rom), with a vertex about every `every` metres. */
export function curveThrough(points: Metres[], every: number, closed = false): Metres[] {
  const count = points.length
  const at = (i: number) =>
    closed ? points[(i + count) % count]! : points[Math.max(0, Math.min(count - 1, i))]!
  const out: Metres[] = []
  for (let i = 0; i < (closed ? count : count - 1); i++) {
    const [a, b, c, d] = [at(i - 1), at(i), at(i + 1), at(i + 2)]
    const steps = Math.max(1, Math.ceil(Math.hypot(c[0] - b[0], c[1] - b[1]) / every))
    for (let s = 0; s < steps; s++) {
      const t = s / steps
      out.push([between(a[0], b[0], c[0], d[0], t), between(a[1], b[1], c[1], d[1], t)])
    }
  }
  out.push(closed ? out[0]! : at(count - 1))
  return out
}

/** Corners cut once at a quarter and three quarters of each side (Chaikin); the ends of an open line stay. */
export function cutCorners(line: Metres[], closed: boolean): Metres[] {
  const out: Metres[] = closed ? [] : [line[0]!]
  for (let i = 0; i + 1 < line.length; i++) {
    const [a, b] = [line[i]!, line[i + 1]!]
    out.push([a[0] * 0.75 + b[0] * 0.25, a[1] * 0.75 + b[1] * 0.25])
    out.push([a[0] * 0.25 + b[0] * 0.75, a[1] * 0.25 + b[1] * 0.75])
  }
  out.push(closed ? out[0]! : line[line.length - 1]!)
  return out
}

const isSame = (a: Metres, b: Metres) => a[0] === b[0] && a[1] === b[1]

/** The stretches of a line where `depth` is above 0, ended exactly where it passes through 0; a ring's start cuts none. */
export function keepWhere(line: Metres[], depth: (at: Metres) => number): Metres[][] {
  const out: Metres[][] = []
  let run: Metres[] = []
  let before: { at: Metres; depth: number } | null = null
  for (const at of line) {
    const here = { at, depth: depth(at) }
    if (before && before.depth > 0 !== here.depth > 0) {
      const t = before.depth / (before.depth - here.depth)
      const edge: Metres = [
        before.at[0] + (at[0] - before.at[0]) * t,
        before.at[1] + (at[1] - before.at[1]) * t,
      ]
      run.push(edge)
      if (here.depth <= 0) {
        out.push(run)
        run = []
      }
    }
    if (here.depth > 0) run.push(at)
    before = here
  }
  if (run.length > 0) out.push(run)
  const [first, last] = [out[0], out.at(-1)]
  if (first && last && first !== last && isSame(first[0]!, line[0]!) && isSame(last.at(-1)!, line[0]!))
    out.splice(0, 1, [...out.pop()!, ...first.slice(1)])
  return out.filter(piece => piece.length > 1)
}

/** Length of a line in metres. */
export function lengthOf(line: Metres[]): number {
  let sum = 0
  for (let i = 0; i + 1 < line.length; i++)
    sum += Math.hypot(line[i + 1]![0] - line[i]![0], line[i + 1]![1] - line[i]![1])
  return sum
}

/** The line turned so that `side` is larger on its right hand than on its left, judged at its middle. */
export function withOnRight(line: Metres[], side: (at: Metres) => number): Metres[] {
  let right = 0
  for (let i = 0; i + 1 < line.length; i += Math.max(1, Math.floor(line.length / 12))) {
    const [a, b] = [line[i]!, line[i + 1]!]
    const long = Math.hypot(b[0] - a[0], b[1] - a[1]) || 1
    const across: Metres = [((b[1] - a[1]) / long) * 20, (-(b[0] - a[0]) / long) * 20]
    const middle: Metres = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2]
    right += side([middle[0] + across[0], middle[1] + across[1]])
    right -= side([middle[0] - across[0], middle[1] - across[1]])
  }
  return right >= 0 ? line : line.toReversed()
}

/** A closed, slightly uneven oval; `wobble` is a fraction of its radii. */
export function oval(
  [east, north]: Metres,
  [rx, ry]: Metres,
  turn: number,
  wobble: (angle: number) => number,
  steps = 64,
): Metres[] {
  const ring: Metres[] = []
  for (let i = 0; i < steps; i++) {
    const angle = (i / steps) * 2 * Math.PI
    const stretch = 1 + wobble(angle)
    const [x, y] = [rx * stretch * Math.cos(angle), ry * stretch * Math.sin(angle)]
    ring.push([
      east + x * Math.cos(turn) - y * Math.sin(turn),
      north + x * Math.sin(turn) + y * Math.cos(turn),
    ])
  }
  ring.push(ring[0]!)
  return ring
}
