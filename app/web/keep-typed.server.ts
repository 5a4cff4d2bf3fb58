import { data } from 'react-router'
import { isDatabaseAway } from './database-away'
import { awaySentence, type Typed } from './responses'

/**
 * Runs what an action does with a form. While the database is away it throws the 503 page that holds everything typed
 * and sends it again with one press, with and without JavaScript.
 */
export async function keepTyped<T>(typed: Typed, work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (error) {
    if (!isDatabaseAway(error)) throw error
    throw data({ reason: awaySentence, typed }, { status: 503 })
  }
}
