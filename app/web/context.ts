import { createContext } from 'react-router'
import type { Database } from '~/db/client.server'
import type { Settings } from './settings'

/** What the server hands to every loader and action; who looks stands in `people/viewer-context`. */
export const databaseContext = createContext<Database>()
export const clockContext = createContext<() => Date>()
export const settingsContext = createContext<Settings>()
export const nonceContext = createContext<string | undefined>()
/** Tells the worker that mails or jobs wait, so that they leave now and not at its next round. */
export const wakeContext = createContext<() => void>(() => {})
