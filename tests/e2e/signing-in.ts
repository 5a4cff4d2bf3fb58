import type { Page } from '@playwright/test'
import type { FreshApp } from './fresh-app'

/** Signs a person of the demo in with the code that comes by mail. */
export async function signIn(page: Page, app: FreshApp, email: string): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill(email)
  await page.locator('main').getByRole('button').click()
  const { text } = await app.mail.waitFor({ to: email, subject: /code/i })
  const digits = /(\d{4})\s?(\d{4})/.exec(text)!
  await page.getByRole('textbox', { name: /code/i }).last().fill(`${digits[1]}${digits[2]}`)
  await page.locator('main').getByRole('button').first().click()
  await page.waitForURL(url => !url.pathname.startsWith('/sign-in'))
}
