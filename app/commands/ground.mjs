import { resolve } from 'node:path'
import { pathToFileURL } from 'node:url'

/** Draws the ground by the module named second into the file named first, telling share and step, a line each. */
const [outFile = '.data/ground.pmtiles', script = 'build/server/ground.js'] = process.argv.slice(2)
const { buildGround } = await import(pathToFileURL(resolve(script)).href)
await buildGround({
  outFile,
  /** @param {number} share @param {string} doing */
  onProgress: (share, doing) => console.log(`${share.toFixed(3)}\t${doing}`),
})
