import type { Feature } from 'geojson'
import { coastLines } from './ground-coast'
import { coverOf } from './ground-cover'
import { heightLines } from './ground-heights'
import { settled } from './ground-settled'
import type { Relief } from './relief'

/** One layer of the vector tiles: its features and the zoom from which tiles carry them. */
export interface GroundLayer {
  name: string
  fromZoom: number
  features: Feature[]
}

/** Everything drawn of the island by layer; Shortbread 1.0 names, and `x_` before those it does not have. */
export function surveyIsland(relief: Relief): GroundLayer[] {
  return [...coverOf(relief), ...heightLines(relief), ...coastLines(relief), ...settled(relief)]
}
