const equator = 6_378_137
const flattening = 1 / 298.257223563
const n = flattening / (2 - flattening)
const meridian = (equator / (1 + n)) * (1 + n ** 2 / 4 + n ** 4 / 64)
const alpha = [
  n / 2 - (2 / 3) * n ** 2 + (5 / 16) * n ** 3,
  (13 / 48) * n ** 2 - (3 / 5) * n ** 3,
  (61 / 240) * n ** 3,
]
const scale = 0.9996
const falseEast = 500_000
const falseNorthInSouth = 10_000_000

/** Grid zone, 1 to 60, of a longitude. */
export const zoneOf = (lon: number): number => Math.min(60, Math.max(1, Math.floor((lon + 180) / 6) + 1))

/**
 * Universal Transverse Mercator metres of a place on WGS 84, in its own zone or the one given, by Krüger's series to
 * the third order (below a millimetre within a zone). South of the equator ten million is added.
 */
export function toGrid(
  lon: number,
  lat: number,
  zone = zoneOf(lon),
): { zone: number; east: number; north: number } {
  const phi = (lat * Math.PI) / 180
  const away = ((lon - (zone * 6 - 183)) * Math.PI) / 180
  const k = (2 * Math.sqrt(n)) / (1 + n)
  const t = Math.sinh(Math.atanh(Math.sin(phi)) - k * Math.atanh(k * Math.sin(phi)))
  const xi = Math.atan2(t, Math.cos(away))
  const eta = Math.atanh(Math.sin(away) / Math.sqrt(1 + t * t))
  let [east, north] = [eta, xi]
  alpha.forEach((a, i) => {
    const j = 2 * (i + 1)
    east += a * Math.cos(j * xi) * Math.sinh(j * eta)
    north += a * Math.sin(j * xi) * Math.cosh(j * eta)
  })
  return {
    zone,
    east: falseEast + scale * meridian * east,
    north: scale * meridian * north + (lat < 0 ? falseNorthInSouth : 0),
  }
}
