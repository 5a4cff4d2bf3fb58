import { expect, test } from 'vitest'
import { toNetwork } from '~/web/network'
import { hashNetwork } from '~/web/network.server'

test.each([
  ['203.0.113.77', '203.0.113.0/24'],
  ['::ffff:203.0.113.77', '203.0.113.0/24'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
  ['2001:0DB8:0001:0002::1', '2001:db8:1:2::/64'],
  ['2001:db8::1', '2001:db8:0:0::/64'],
  ['::1', '0:0:0:0::/64'],
  ['fe80::1%eth0', 'fe80:0:0:0::/64'],
  ['nonsense', 'unknown'],
  [undefined, 'unknown'],
])('the address %s belongs to the network %s', (address, network) => {
  expect(toNetwork(address)).toBe(network)
})

test('neighbours share a hashed network, which another installation writes otherwise', () => {
  const hash = hashNetwork('203.0.113.77', 'secret')
  expect(hash).toMatch(/^[0-9a-f]{64}$/)
  expect(hashNetwork('203.0.113.1', 'secret')).toBe(hash)
  expect(hashNetwork('203.0.114.77', 'secret')).not.toBe(hash)
  expect(hashNetwork('203.0.113.77', 'other secret')).not.toBe(hash)
})
