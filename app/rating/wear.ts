/** The share of a round bar's section lost to a flat groove of depth h in a bar of diameter d (a circle's segment). */
export function toSegmentLoss(h: number, d: number): number {
  const r = d / 2
  if (h <= 0) return 0
  if (h >= d) return 1
  const area = r * r * Math.acos((r - h) / r) - (r - h) * Math.sqrt(2 * r * h - h * h)
  return area / (Math.PI * r * r)
}

/** The share lost when what is left is a circle of the remaining thickness: 1 − (1 − h/d)², the cautious end. */
export function toReducedCircleLoss(h: number, d: number): number {
  return 1 - Math.max(0, 1 - h / d) ** 2
}
