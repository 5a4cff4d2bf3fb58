import { createHmac } from 'node:crypto'
import { toNetwork } from './network'

/** A network as limits know it: keyed with the installation's secret, so that no address can be read back from it. */
export function hashNetwork(address: string | undefined, appSecret: string): string {
  return createHmac('sha256', appSecret)
    .update(`network ${toNetwork(address)}`)
    .digest('hex')
}
