import type { Config } from '@react-router/dev/config'

export default {
  ssr: true,
  // a pattern, since the server build has further entries (vite.config.ts)
  serverBuildFile: '[name].js',
  // a page behind a mailed link sends no origin; who may post from where is decided by app/web/origin.server.ts
  allowedActionOrigins: ['null'],
  future: {
    v8_middleware: true,
    v8_splitRouteModules: true,
    v8_viteEnvironmentApi: true,
    v8_passThroughRequests: true,
    v8_trailingSlashAwareDataRequests: true,
  },
} satisfies Config
