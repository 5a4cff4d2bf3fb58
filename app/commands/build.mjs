import { resolve } from 'node:path'
import { pathToFileURL } from 'node:url'
import { inStep } from './progress.mjs'
import { runOrFail } from './run.mjs'
import { buildSources, groundSources, makeWhenChanged } from './sources.mjs'

/** Builds client and server into build/, when their sources have changed. */
export function buildApp() {
  return makeWhenChanged(
    {
      stamp: 'build/made-from',
      sources: buildSources,
      results: [
        'build/server/index.js',
        'build/server/seed.js',
        'build/server/ground.js',
        'build/client/assets',
      ],
    },
    () =>
      inStep('Building', tell =>
        runOrFail(resolve('node_modules/.bin/react-router'), ['build'], {
          onLine: line => tell(line.trim()),
          env: { NODE_ENV: 'production', NO_COLOR: '1' },
        }),
      ),
  )
}

/**
 * Draws the ground of the map into `file`, when it is missing or its sources have changed: by the build, or in
 * development from the sources.
 * @param {string} file
 * @param {{ isFromSource?: boolean }} [options]
 */
export function buildGround(file, { isFromSource = false } = {}) {
  const draw = 'app/commands/ground.mjs'
  const given = isFromSource ? ['--import', 'tsx', draw, file, 'tiles/build.ts'] : [draw, file]
  return makeWhenChanged({ stamp: `${file}.made-from`, sources: groundSources, results: [file] }, () =>
    inStep('Drawing the ground of the map', tell =>
      // in a process of its own: it is plain computing for seconds, and Ctrl-C must be heard
      runOrFail(process.execPath, given, {
        onLine(line) {
          const [share, doing] = line.split('\t')
          if (doing !== undefined) tell(doing, Number(share))
        },
      }),
    ),
  )
}

/**
 * One module of the server build.
 * @param {string} name
 * @returns {Promise<any>}
 */
export function importBuilt(name) {
  return import(pathToFileURL(resolve(`build/server/${name}.js`)).href)
}
