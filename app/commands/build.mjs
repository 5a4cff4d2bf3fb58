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
 * Draws the ground of the map into `file`, when it is missing or its sources have changed. `script` is the built one,
 * or in development the source.
 * @param {string} file
 * @param {string[]} [script]
 */
export function buildGround(file, script = ['app/commands/ground.mjs']) {
  return makeWhenChanged({ stamp: `${file}.made-from`, sources: groundSources, results: [file] }, () =>
    inStep('Drawing the ground of the map', tell =>
      // in a process of its own: it is minutes of plain computing on a slow machine, and Ctrl-C must be heard
      runOrFail(process.execPath, [...script, file], {
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
