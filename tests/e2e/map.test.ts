import { axe, expect, test } from './fresh-app'

test('Map and list are one selection, and the list alone stands without WebGL', async ({
  page,
  openBrowser,
  isMobile,
}) => {
  await page.goto('/')
  const map = page.locator('.crag-map')
  await expect(map).toHaveAttribute('data-map-idle', 'true', { timeout: 30_000 })
  await axe(page)
  if (!isMobile) {
    await page.getByRole('link', { name: /Gannet Wall/ }).focus()
    await expect(page.locator('.crag-row[data-selected]')).toContainText('Gannet Wall')
  }
  await page.getByRole('link', { name: /Gannet Wall/ }).click()
  await expect(page.getByRole('heading', { name: 'Gannet Wall', level: 1 })).toBeVisible()

  const poor = await openBrowser()
  await poor.addInitScript(() => {
    HTMLCanvasElement.prototype.getContext = () => null
  })
  await poor.goto('/')
  await expect(poor.getByText('This browser cannot draw the map')).toBeVisible()
  await expect(poor.getByRole('link', { name: /Raven Quarry/ })).toBeVisible()
})

test('A tile outside the ground is empty, and numbers that cannot be are refused in a sentence', async ({
  page,
}) => {
  const status = async (path: string) => (await page.request.get(path)).status()
  expect(await status('/ground/0/0/0.mvt')).toBe(200)
  expect(await status('/ground/12/0/0.mvt')).toBe(204)
  expect(await status('/ground/3/9/0.mvt')).toBe(400)
  expect(await status('/ground/3/x/0.mvt')).toBe(400)
})
