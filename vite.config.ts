import { fileURLToPath } from 'node:url'
import { reactRouter } from '@react-router/dev/vite'
import tailwindcss from '@tailwindcss/vite'
import { defineConfig } from 'vitest/config'

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))
const underTest = process.env.VITEST !== undefined

/** The server build's further inputs: Node 20 runs no TypeScript, so commands import these from build/server. */
const serverInputs = {
  index: './app/server.ts',
  seed: './drizzle/seed.ts',
  ground: './tiles/build.ts',
  'fake-mail': './fakes/mail/server.ts',
}

export default defineConfig({
  plugins: underTest ? [] : [tailwindcss(), reactRouter()],
  resolve: { alias: { '~': here('./app') } },
  environments: {
    ssr: {
      build: {
        rollupOptions: { input: serverInputs },
      },
    },
  },
  test: {
    setupFiles: ['tests/console-errors.ts'],
    projects: [
      { extends: true, test: { name: 'unit', include: ['tests/unit/**/*.test.{ts,tsx}'] } },
      { extends: true, test: { name: 'published', include: ['tests/published/**/*.test.ts'] } },
      {
        extends: true,
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          globalSetup: ['tests/integration/database.global.ts'],
          testTimeout: 20_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
    ],
  },
})
