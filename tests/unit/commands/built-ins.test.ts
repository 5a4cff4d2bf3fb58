import { readFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { expect, test } from 'vitest'

const commands = join(import.meta.dirname, '../../../app/commands')

/** What a module imports before its first line runs. */
const listImports = (file: string) =>
  [...readFileSync(file, 'utf8').matchAll(/^(?:import|export)\s(?:[^'()]*?\sfrom\s)?'([^']+)'/gm)].map(
    ([, path]) => path!,
  )

function listPackages(file: string, seen = new Set<string>()): string[] {
  if (seen.has(file)) return []
  seen.add(file)
  return listImports(file).flatMap(path => {
    if (path.startsWith('.')) return listPackages(join(dirname(file), path), seen)
    return path.startsWith('node:') ? [] : [`${file}: ${path}`]
  })
}

test.each(['start', 'dev', 'test', 'check', 'db-reset'])(
  '%s begins on a machine where no package is installed yet',
  name => {
    expect(listPackages(join(commands, `${name}.mjs`))).toEqual([])
  },
)

test('a module that needs a package would be found', () => {
  expect(listPackages(join(commands, 'database.mjs'))).toEqual([expect.stringContaining('mysql2/promise')])
})
