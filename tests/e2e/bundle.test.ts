import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from './fresh-app'

const assets = join(import.meta.dirname, '../../build/client/assets')
const scripts = () => readdirSync(assets).filter(name => name.endsWith('.js'))

test('No server code and no schema library reaches the browser', async () => {
  for (const name of scripts()) {
    const text = readFileSync(join(assets, name), 'utf8')
    expect(text.includes('ZodError'), `zod in ${name}`).toBe(false)
    expect(/drizzle|mysql2|nodemailer/.test(text), `server code in ${name}`).toBe(false)
  }
})

test('The map is loaded only where there is a map', async ({ page }) => {
  const loaded: string[] = []
  page.on('request', request => loaded.push(request.url()))
  await page.goto('/crags')
  await page.waitForLoadState('networkidle')
  expect(loaded.filter(url => /maplibre|drawn-map|crag-map/.test(url))).toEqual([])
})
