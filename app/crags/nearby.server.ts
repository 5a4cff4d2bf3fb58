import { distance } from '@turf/turf'
import type { Queryable } from '~/db/client.server'
import type { Viewer } from '~/people/viewer'
import { listCrags } from './crags.server'

/**
 * The crags nearest to one, with how far they lie in kilometres over the ground of a sphere (within half a percent of
 * the ellipsoid), nearest first; only crags the viewer may see.
 */
export async function listNearby(
  db: Queryable,
  viewer: Viewer,
  crag: { code: string; pos: { lon: number; lat: number } },
  most = 3,
) {
  const from = [crag.pos.lon, crag.pos.lat]
  return (await listCrags(db, viewer))
    .filter(other => other.code !== crag.code)
    .map(({ code, name, worstState, pos }) => ({
      code,
      name,
      worstState,
      km: distance(from, [pos.lon, pos.lat], { units: 'kilometers' }),
    }))
    .sort((a, b) => a.km - b.km)
    .slice(0, most)
}
