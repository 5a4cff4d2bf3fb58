import { installDebian } from './debian.mjs'
import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { parts, runParts } from './parts.mjs'

/** Everything that shows whether the product works, on a machine with only Node, npm and apt. */
await live(async life => {
  await installDebian(['database', 'browser'])
  await installPackages()
  const { failed } = await runParts([
    parts.types,
    parts.lint,
    parts.unused,
    parts.unit,
    parts.integration,
    parts.published,
    parts.build,
    parts.journeys,
  ])
  await life.end(failed > 0 ? 1 : 0)
})
