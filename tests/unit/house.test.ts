import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, normalize, relative } from 'node:path'
import { describe, expect, it } from 'vitest'

const root = join(import.meta.dirname, '../..')

/** Lowest first: a room imports from those before it. */
const rooms = ['record', 'mail', 'people', 'map', 'crags', 'rating', 'reports', 'notices', 'work']
const below = ['lib', 'db', 'web', 'ui']
/** What each place below the rooms may import of the others. */
const mayBelow: Record<string, string[]> = { lib: [], db: ['lib'], web: ['lib', 'db'], ui: ['lib'] }

function listFiles(folder: string): string[] {
  return readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
    .filter(path => /\.(ts|tsx|mjs)$/.test(path))
    .map(path => join(folder, path))
}

const files = listFiles('app')
const placeOf = (file: string) => file.split('/')[1] ?? ''

/** The files and folders of ours that a file imports, as paths from the root. */
function listImports(file: string): string[] {
  const text = readFileSync(join(root, file), 'utf8')
  return [...text.matchAll(/(?:from|import)\s+'([^']+)'/g)]
    .map(([, path]) => path!)
    .filter(path => path.startsWith('~/') || path.startsWith('.'))
    .filter(path => !path.includes('+types'))
    .map(path => (path.startsWith('~/') ? path.replace('~/', 'app/') : normalize(join(dirname(file), path))))
}

/** A table's word lists come from the pure file of its room. */
const isWordList = (file: string, path: string) =>
  file.startsWith('app/db/schema/') && !path.includes('.server')

function findFault(file: string, path: string): string | null {
  const [from, to] = [placeOf(file), placeOf(path)]
  if (!path.startsWith('app/') || from === to || !/\//.test(file.slice(4))) return null
  if (from === 'routes' || isWordList(file, path)) return null
  if (below.includes(from)) return mayBelow[from]!.includes(to) ? null : `${file} imports ${path}`
  if (below.includes(to)) return null
  return rooms.indexOf(to) >= 0 && rooms.indexOf(to) < rooms.indexOf(from) ? null : `${file} imports ${path}`
}

describe('The house', () => {
  it('has rooms that import only from the rooms before them', () => {
    const faults = files.flatMap(file => listImports(file).flatMap(path => findFault(file, path) ?? []))
    expect(faults).toEqual([])
  })

  it('keeps the server out of components and pure files', () => {
    const faults = files
      .filter(
        file =>
          !/\.(server|schema)\./.test(file) &&
          !file.startsWith('app/routes') &&
          !file.startsWith('app/entry'),
      )
      .filter(file => rooms.includes(placeOf(file)) || below.includes(placeOf(file)))
      .flatMap(file =>
        readFileSync(join(root, file), 'utf8')
          .split('\n')
          .filter(line => /^import (?!type).*\.server'/.test(line))
          .map(line => `${file}: ${line}`),
      )
    expect(faults).toEqual([])
  })

  it('has no SQL and no tables in its routes', () => {
    const faults = files
      .filter(file => file.startsWith('app/routes'))
      .filter(
        file =>
          listImports(file).some(path => path.startsWith('app/db')) ||
          /drizzle/.test(readFileSync(join(root, file), 'utf8')),
      )
    expect(faults).toEqual([])
  })

  it('lists every route module in the table of contents, and no other', () => {
    const listed = [...readFileSync(join(root, 'app/routes.ts'), 'utf8').matchAll(/'(routes\/[^']+)'/g)].map(
      ([, path]) => path!,
    )
    const there = files
      .filter(file => file.startsWith('app/routes/') && file.endsWith('.tsx'))
      .map(file => relative('app', file))
    expect(there.sort()).toEqual(listed.sort())
  })

  it('has no drawer for odds and ends', () => {
    const drawers = [...files, ...listFiles('tests'), ...listFiles('tiles'), ...listFiles('fakes')].filter(
      file => /(^|\/)(utils|helpers|misc|common|types|constants)\.(ts|tsx|mjs)$/.test(file),
    )
    expect(drawers).toEqual([])
  })

  it('has fakes that know nothing of the app', () => {
    const faults = listFiles('fakes').filter(file => listImports(file).some(path => path.startsWith('app/')))
    expect(faults).toEqual([])
  })

  it('never says that gear is safe', () => {
    const faults = files
      .filter(file => /\.(ts|tsx)$/.test(file))
      .flatMap(file =>
        readFileSync(join(root, file), 'utf8')
          .split('\n')
          .filter(line => /['"`>][^'"`]*\b(un)?safe(ly|ty)?\b/i.test(line) && !/unsafe-inline/.test(line))
          .map(line => `${file}: ${line.trim()}`),
      )
    expect(faults).toEqual([])
  })
})
