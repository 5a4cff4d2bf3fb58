import { importBuilt } from './build.mjs'

/** Draws the ground into the file named first, telling share and step a line each. */
const [outFile = '.data/ground.pmtiles'] = process.argv.slice(2)
const { buildGround } = await importBuilt('ground')
await buildGround({
  outFile,
  /** @param {number} share @param {string} doing */
  onProgress: (share, doing) => console.log(`${share.toFixed(3)}\t${doing}`),
})
