import { expect, test } from './fresh-app'
import { drawRing } from './pictures'
import { signIn } from './signing-in'

test('Reporting, with an error on the way, and accepting a job work without JavaScript', async ({
  app,
  openBrowser,
  announce,
}) => {
  // the first try is wrong on purpose, and the job is accepted twice
  announce(/status of 4(00|09)/)
  const guest = await openBrowser({ javaScriptEnabled: false })
  await guest.goto('/')
  await expect(guest.getByRole('link', { name: /Gannet Wall/ })).toBeVisible()
  await guest.goto('/report')
  await guest.getByLabel('Route, crag or tag code').fill('Slack Water')
  await guest.getByRole('button', { name: 'Look up' }).click()
  await guest.getByRole('link', { name: /Slack Water/ }).click()
  await guest.getByRole('button', { name: 'Go on' }).click()
  await expect(guest.getByRole('alert')).toContainText('Choose one on the line first')
  await guest.getByRole('radio', { name: /Lower-off/ }).check()
  await guest.getByRole('button', { name: 'Go on' }).click()

  await guest.getByRole('checkbox', { name: /Groove or wear/ }).check()
  await guest.getByLabel('Measured, in mm').fill('deep')
  await guest.getByLabel('In your words').fill('Ригель изношен слева.')
  await guest.getByLabel('Your e-mail address').fill('nobody')
  await guest
    .getByLabel('Add photo')
    .setInputFiles([
      await drawRing(),
      { name: 'letter.txt', mimeType: 'text/plain', buffer: Buffer.from('no photo at all') },
    ])
  await guest.getByRole('button', { name: 'Send report' }).click()
  const alert = guest.getByRole('alert').first()
  await expect(alert).toContainText('for example 3.3')
  await expect(alert).toContainText('mara@example.org')
  await expect(alert).toContainText('“letter.txt” is not a photo we can read')
  await expect(guest.getByLabel('In your words')).toHaveValue('Ригель изношен слева.')
  await expect(guest.getByRole('checkbox', { name: 'send it' })).toBeChecked()

  await guest.getByLabel('Measured, in mm').fill('3.3')
  await guest
    .getByRole('group', { name: 'What are its edges like?' })
    .getByRole('radio', { name: 'sharp' })
    .check()
  await guest.getByLabel('Your e-mail address').fill('guest@climbers.example')
  await guest.getByRole('button', { name: 'Send report' }).click()
  await expect(guest.getByRole('heading', { name: 'Thank you, your report is here' })).toBeVisible()

  const ines = await openBrowser()
  await signIn(ines, app, 'ines@keld.example')
  await ines.goto('/hazards')
  await ines.getByRole('link', { name: 'Decide' }).click()
  await expect(ines.locator('fieldset img')).toHaveCount(1)
  await ines.getByRole('button', { name: 'Take in' }).click()
  await ines.getByRole('link', { name: 'Make order' }).click()
  await ines.getByLabel('What is to be done').fill('Replace the ring.')
  await ines.getByRole('button', { name: 'Make order' }).click()
  await ines.getByLabel('Offer the job to').selectOption('Tam Ridley')
  await ines.getByRole('button', { name: 'Offer by mail' }).click()

  const offer = await app.mail.waitFor({ to: 'tam@keld.example', subject: /^A job for you/ })
  const tam = await openBrowser({ javaScriptEnabled: false })
  await tam.goto(/https?:\/\/\S+\/offers\/\S+/.exec(offer.text)![0])
  await tam.getByRole('button', { name: 'Accept job' }).click()
  await expect(tam.getByText('The job is yours')).toBeVisible()
  await tam.reload()
  await tam.goto(/https?:\/\/\S+\/offers\/\S+/.exec(offer.text)![0])
  await expect(tam.getByText('You have accepted this job already')).toBeVisible()
})
