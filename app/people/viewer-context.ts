import { createContext } from 'react-router'
import type { Viewer } from './viewer'

/** Who looks, and the hashes that own a session and a guest's staged photos. */
export interface KnownViewer extends Viewer {
  sessionHash: string | null
  guestHash: string | null
  confirmedAt: Date | null
}

export const viewerContext = createContext<KnownViewer>()
