import { mkdirSync, renameSync, writeFileSync } from 'node:fs'
import { dirname, resolve } from 'node:path'
import { pathToFileURL } from 'node:url'
import { Archive, packed } from './archive'
import { type Cutter, tileCutter, tileOf } from './cut'
import { toLonLat } from './geography'
import { type GroundLayer, surveyIsland } from './ground'
import { raiseIsland } from './relief'
import { middle, seaBox, sheet } from './skerrow'
import { worldOcean } from './world'

const farZoom = 6
const nearZoom = 14

export interface BuildOptions {
  outFile: string
  /** Told the share done, from 0 to 1, and what is being done. */
  onProgress?: (share: number, doing: string) => void
}

/** Builds the ground of Skerrow into a PMTiles archive, whole or not at all; the same bytes every time. */
export async function buildGround({
  outFile,
  onProgress = () => {},
}: BuildOptions): Promise<{ bytes: number }> {
  onProgress(0, 'raising the island')
  const relief = raiseIsland()
  onProgress(0.35, 'drawing shores, contours and roads')
  const layers = surveyIsland(relief)
  const archive = new Archive()
  onProgress(0.6, 'cutting the world')
  cutWorld(archive)
  const cut = tileCutter(layers)
  for (let z = farZoom + 1; z <= nearZoom; z++) {
    onProgress(0.65 + (0.3 * (z - farZoom)) / (nearZoom - farZoom), `cutting zoom ${z}`)
    cutSea(archive, cut, z)
  }
  const bytes = archive.toBytes({
    name: 'Isle of Skerrow',
    attribution: 'Ground: the Isle of Skerrow, invented. Far coasts: Natural Earth',
    bounds: seaBox,
    centre: { ...middle, zoom: 12 },
    vectorLayers: listed(layers),
  })
  mkdirSync(dirname(resolve(outFile)), { recursive: true })
  writeFileSync(`${outFile}.part`, bytes)
  renameSync(`${outFile}.part`, outFile)
  onProgress(1, 'done')
  return { bytes: bytes.length }
}

function cutWorld(archive: Archive): void {
  const cut = tileCutter(worldOcean())
  for (let z = 0; z <= farZoom; z++)
    for (let x = 0; x < 2 ** z; x++)
      for (let y = 0; y < 2 ** z; y++) {
        const tile = cut(z, x, y)
        if (tile) archive.add(z, x, y, tile)
      }
}

/** The sea box at one zoom: the island's tiles cut, all others one tile of open sea. */
function cutSea(archive: Archive, cut: Cutter, z: number): void {
  const [west, north] = tileOf(seaBox.west, seaBox.north, z)
  const [east, south] = tileOf(seaBox.east, seaBox.south, z)
  const [left, top] = tileOf(...lonLat(sheet.west, sheet.north), z)
  const [right, low] = tileOf(...lonLat(sheet.east, sheet.south), z)
  for (let x = west; x <= east; x++)
    for (let y = north; y <= south; y++) {
      const onSheet = x >= left && x <= right && y >= top && y <= low
      const tile = onSheet ? cut(z, x, y) : null
      if (tile) archive.add(z, x, y, tile)
      else archive.addPacked(z, x, y, openSea())
    }
}

const lonLat = (east: number, north: number) => toLonLat([east, north]) as [number, number]

let sea: Buffer | null = null
function openSea(): Buffer {
  if (sea) return sea
  const everywhere = [-180, 180].flatMap(lon => [
    [lon, -85.06 * Math.sign(lon)],
    [lon, 85.06 * Math.sign(lon)],
  ])
  const ring = [...everywhere, everywhere[0]!]
  const ocean = {
    type: 'Feature' as const,
    properties: {},
    geometry: { type: 'Polygon' as const, coordinates: [ring] },
  }
  sea = packed(tileCutter([{ name: 'ocean', fromZoom: 0, features: [ocean] }])(2, 1, 1)!)
  return sea
}

/** The layers as the archive lists them: name, zooms, and the kind of each attribute. */
function listed(layers: GroundLayer[]) {
  const known = new Map<
    string,
    { id: string; fields: Record<string, string>; minzoom: number; maxzoom: number }
  >()
  for (const { name, fromZoom, features } of layers) {
    const layer = known.get(name) ?? { id: name, fields: {}, minzoom: fromZoom, maxzoom: nearZoom }
    layer.minzoom = name === 'ocean' ? 0 : Math.min(layer.minzoom, fromZoom)
    for (const { properties } of features)
      for (const [key, value] of Object.entries(properties ?? {})) {
        const kind = typeof value
        layer.fields[key] = kind === 'string' ? 'String' : kind === 'number' ? 'Number' : 'Boolean'
      }
    known.set(name, layer)
  }
  return [...known.values()]
}

function showProgress(share: number, doing: string): void {
  const done = Math.round(share * 30)
  const bar = `${'='.repeat(done)}${' '.repeat(30 - done)}`
  process.stderr.write(`\rGround [${bar}] ${doing.padEnd(38)}${share === 1 ? '\n' : ''}`)
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const outFile = process.argv[2] ?? '.data/ground.pmtiles'
  const { bytes } = await buildGround({ outFile, onProgress: showProgress })
  console.log(`${outFile}: ${(bytes / 1e6).toFixed(1)} MB`)
}
