import { createContext } from 'react-router'

/** The hashed network a request comes from (`hashNetwork`): limits count by it, nothing else reads it. */
export const networkContext = createContext<string>()

/**
 * The network of an address: the first 24 bits of IPv4, the first 64 of IPv6, as text; an IPv4 address written as
 * IPv6 counts as IPv4. Anything else is one network called `unknown`.
 */
export function toNetwork(address: string | undefined): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address ?? '')
  const text = (mapped?.[1] ?? address ?? '').split('%')[0]!
  if (/^\d{1,3}(\.\d{1,3}){3}$/.test(text)) return `${text.split('.').slice(0, 3).join('.')}.0/24`
  if (!/^[0-9a-f:]+$/i.test(text) || !text.includes(':')) return 'unknown'
  return `${toGroups(text).slice(0, 4).join(':')}::/64`
}

function toGroups(address: string): string[] {
  const [head = '', tail] = address.toLowerCase().split('::')
  const before = head === '' ? [] : head.split(':')
  const after = tail === undefined || tail === '' ? [] : tail.split(':')
  const zeros = Array.from({ length: Math.max(0, 8 - before.length - after.length) }, () => '0')
  return [...before, ...zeros, ...after].map(group => group.replace(/^0+(?=.)/, ''))
}
