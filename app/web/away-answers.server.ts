import { data, type ServerBuild } from 'react-router'
import { isDatabaseAway } from './database-away'

type Answering = (args: never) => unknown

/** A loader or action that answers 503 with a sentence instead of failing while the database is away. */
function answerAway<F extends Answering>(answer: F | undefined): F | undefined {
  if (answer === undefined) return undefined
  const answering = async (args: never) => {
    try {
      return await answer(args)
    } catch (error) {
      if (isDatabaseAway(error)) throw data({}, { status: 503 })
      throw error
    }
  }
  return answering as unknown as F
}

/** The framework's build with every page answering 503, on the server and by fetch, while the database is away. */
export function answerWhileAway(build: ServerBuild): ServerBuild {
  const routes = Object.entries(build.routes).map(([id, route]) => {
    if (route === undefined) return [id, route] as const
    const { loader, action } = route.module
    const module = { ...route.module, loader: answerAway(loader), action: answerAway(action) }
    return [id, { ...route, module }] as const
  })
  return { ...build, routes: Object.fromEntries(routes) }
}
