import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { parts, runParts } from './parts.mjs'

/** The quick look while working: everything that needs neither database nor browser. */
await live(async life => {
  await installPackages()
  const { failed } = await runParts([parts.types, parts.lint, parts.unused, parts.unit, parts.published])
  await life.end(failed > 0 ? 1 : 0)
})
