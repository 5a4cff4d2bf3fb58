/** Sizes of a drawn line in its own pixels. */
export interface LineScale {
  lengthM: number
  /** where metre 0 is drawn, from above */
  base: number
  /** pixels a metre */
  perMetre: number
}

/** Pixels from above at so many metres up. */
export function toY(scale: LineScale, metres: number): number {
  return scale.base - metres * scale.perMetre
}

/**
 * Heights of labels that want to stand at `wanted` (pixels from above, lowest first, so descending) but at least `gap`
 * apart and within `top` to `bottom`: each as near to its place as the others let it. Same order out as in.
 */
export function spreadLabels(
  wanted: readonly number[],
  { gap, top, bottom }: { gap: number; top: number; bottom: number },
): number[] {
  // blocks of labels that touch move as one, to the mean of what they want
  const blocks: { at: number[]; start: number }[] = []
  for (const [index, y] of wanted.entries()) {
    blocks.push({ at: [index], start: Math.min(y, bottom) })
    while (blocks.length > 1) {
      const lower = blocks.at(-2)!
      const upper = blocks.at(-1)!
      if (lower.start - lower.at.length * gap >= upper.start) break
      const at = [...lower.at, ...upper.at]
      const mean = at.reduce((sum, label, rank) => sum + wanted[label]! + rank * gap, 0) / at.length
      blocks.splice(-2, 2, { at, start: Math.min(mean, bottom) })
    }
  }
  const placed = blocks.flatMap(block => block.at.map((_, rank) => block.start - rank * gap))
  // what is pushed above the top pushes back down from there
  for (let i = placed.length - 1; i >= 0; i--) {
    const least = i === placed.length - 1 ? top : placed[i + 1]! + gap
    placed[i] = Math.max(placed[i]!, least)
  }
  return placed
}

/** The two sizes of the drawing, in its own pixels: the page's row holds all words, the phone's has them below the name. */
export const layouts = {
  page: {
    id: 'page',
    width: 580,
    centre: 118,
    rock: 64,
    gap: 27,
    metre: 34,
    point: 46,
    name: 15,
    className: 'hidden sm:block',
  },
  phone: {
    id: 'phone',
    width: 358,
    centre: 104,
    rock: 44,
    gap: 46,
    metre: 30,
    point: 56,
    name: 16,
    className: 'sm:hidden',
  },
} as const
export type Layout = (typeof layouts)[keyof typeof layouts]
