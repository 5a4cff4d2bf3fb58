import { buildApp, buildGround } from '../../app/commands/build.mjs'

/** where the ground stands that all journeys share */
export const groundFile = 'build/ground.pmtiles'

/** Journeys go through the build of the sources as they are. */
export default async function setUp(): Promise<void> {
  await buildApp()
  await buildGround(groundFile)
}
