import { expect, test } from './fresh-app'

test('While the database is away pages say so, the form is kept, and all comes back by itself', async ({
  page,
  app,
  announce,
}) => {
  announce(/503|Failed to load resource/)
  await page.goto('/find?q=slack')
  await page.getByRole('link', { name: /Slack Water/ }).click()
  await page.getByRole('link', { name: 'Report something on this route' }).click()
  await page.getByRole('radio', { name: /Lower-off/ }).check()
  await page.getByRole('button', { name: 'Go on' }).click()
  await page.getByRole('checkbox', { name: /Loose or spinning/ }).check()
  await page.getByRole('checkbox', { name: 'the whole bolt turns by hand' }).check()
  await page.getByLabel('In your words').fill('Turns a quarter of the way round.')
  await page.getByLabel('Your e-mail address').fill('guest@climbers.example')

  await app.database.stop()
  await page.getByRole('button', { name: 'Send report' }).click()
  await expect(page.getByRole('heading', { name: 'The record cannot be reached just now' })).toBeVisible()
  await expect(page.getByText('Turns a quarter of the way round.')).toBeVisible()
  const away = await page.request.get('/crags')
  expect(away.status()).toBe(503)
  expect((await page.request.get('/healthz')).status()).toBe(200)
  expect((await page.request.get('/readyz')).status()).toBe(503)

  await app.database.start()
  await page.getByRole('button', { name: 'Send it again' }).click()
  await expect(page.getByRole('heading', { name: 'Thank you, your report is here' })).toBeVisible()
  await app.mail.waitFor({ to: 'guest@climbers.example', subject: /^Received/ })
  await expect.poll(async () => (await page.request.get('/readyz')).status(), { timeout: 40_000 }).toBe(200)
})
