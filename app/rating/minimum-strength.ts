/** Minimum strengths of connectors by class, kN: major axis closed, gate open, minor axis (null: not asked). EN 12275:2013. */
export const connectorMinimum = {
  B: { major: 20, open: 7, minor: 7 },
  H: { major: 20, open: 6, minor: 7 },
  K: { major: 25, open: 8, minor: 7 },
  A: { major: 20, open: 7, minor: null },
  T: { major: 20, open: 7, minor: null },
  Q: { major: 25, open: null, minor: 10 },
  X: { major: 18, open: 5, minor: 7 },
} as const

/** What a rock anchor withstands when new, kN. EN 959:2018, 4.3. */
export const anchorMinimum = { axial: 15, radial: 25, linkedBelayPart: 25 } as const
