/** Condition marks of crags and points on the map: a ring wearing through, one shape for each state. */
export const markStates = ['severe', 'poor', 'fair', 'unknown', 'good'] as const
export type MarkState = (typeof markStates)[number]

export type MapTheme = 'light' | 'dark'

/** One stroke or area of a mark, on a grid of 16; `ink` names a colour of markInks. */
export interface MarkPart {
  path: string
  ink: 'slate' | 'stone' | 'ochre' | 'oxide'
  stroke?: number
  dash?: [drawn: number, left: number, from: number]
}

const ring = 'M13.75 8A5.75 5.75 0 1 1 2.25 8A5.75 5.75 0 1 1 13.75 8Z'

export const markShapes: Record<MarkState, MarkPart[]> = {
  good: [{ path: ring, ink: 'slate', stroke: 1.5 }],
  fair: [
    { path: ring, ink: 'slate', stroke: 1.5 },
    { path: 'M2.5 9.5H13.5A5.75 5.75 0 0 1 2.5 9.5Z', ink: 'slate' },
  ],
  poor: [
    {
      path: 'M3.9 14.1A7.4 7.4 0 1 1 12.1 14.1L10.6 11V8A2.6 2.6 0 1 0 5.4 8V11Z',
      ink: 'ochre',
    },
  ],
  severe: [
    { path: 'M8.7 2.3A6.6 6.6 0 1 0 4.7 14.9Z', ink: 'oxide' },
    { path: 'M11.3 1.1A6.6 6.6 0 0 1 7.3 13.7Z', ink: 'oxide' },
  ],
  unknown: [{ path: ring, ink: 'stone', stroke: 1.75, dash: [3.01, 3.01, 1.5] }],
}

/** Inks of the marks by theme, and the disc of page colour that lifts a mark off the ground. */
export const markInks: Record<MapTheme, Record<MarkPart['ink'] | 'disc', string>> = {
  light: { slate: '#1f2a30', stone: '#56636a', ochre: '#a96800', oxide: '#9a1c14', disc: '#f6f3ec' },
  dark: { slate: '#ebe6da', stone: '#a3aeb2', ochre: '#e3a945', oxide: '#ff7152', disc: '#10181a' },
}

/** Order of drawing: the worse, the later and so the higher. */
export const drawingOrder = (state: MarkState): number => markStates.length - markStates.indexOf(state)

/** Name under which the map keeps a mark's picture. */
export const markImageName = (state: MarkState, theme: MapTheme): string => `mark-${state}-${theme}`

/** Name of the four corner ticks around a selected mark, or of the lighter ones around the one pointed at. */
export const cornersImageName = (kind: 'selected' | 'hovered', theme: MapTheme): string =>
  `corners-${kind}-${theme}`

/** What to draw for a picture's name, or null when the name is none of ours. */
export function findMapImage(
  name: string,
):
  | { kind: 'mark'; state: MarkState; theme: MapTheme }
  | { kind: 'selected' | 'hovered'; theme: MapTheme }
  | null {
  const [what, which, theme] = name.split('-')
  if (theme !== 'light' && theme !== 'dark') return null
  const state = markStates.find(known => known === which)
  if (what === 'mark' && state) return { kind: 'mark', state, theme }
  if (what === 'corners' && (which === 'selected' || which === 'hovered')) return { kind: which, theme }
  return null
}
