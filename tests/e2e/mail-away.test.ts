import { expect, test } from './fresh-app'

test('A mail that cannot leave now leaves a minute later, once', async ({ page, app }) => {
  app.mail.fake.failNext(1)
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill('pia@climbers.example')
  await page.locator('main').getByRole('button').click()
  await expect(page.getByRole('textbox', { name: /code/i }).last()).toBeVisible()
  expect(app.mail.fake.seen()).toEqual([])
  await expect.poll(() => app.mail.fake.seen().length, { timeout: 100_000, intervals: [1_000] }).toBe(1)
  await page.waitForTimeout(3_000)
  expect(app.mail.fake.seen()).toHaveLength(1)
})
