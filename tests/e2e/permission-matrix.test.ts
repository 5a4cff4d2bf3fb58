import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Page } from '@playwright/test'
import { expect, test } from './fresh-app'
import { signIn } from './signing-in'

/** Everybody who may come: the crag of the rows is Raven Quarry, which the Harrow Bolt Crew and the Forum look after. */
const who = {
  guest: null,
  climber: 'pia@climbers.example',
  rebolter: 'wyn@harrow.example',
  coordinator: 'bram@harrow.example',
  'access officer': 'oona@forum.example',
  'other rebolter': 'tam@keld.example',
  'other coordinator': 'ines@keld.example',
  'other admin': 'edda@keld.example',
} as const
type Who = keyof typeof who
const everybody = Object.keys(who) as Who[]

/** Where a crag's things are found, filled in from the demo. */
interface Found {
  crag: string
  climb: string
  climbCode: string
  point: string
  hazard: string
  report: string
  order: string
  notice: string
}

type Answers = Partial<Record<Who, number>> & { rest: number }

interface Row {
  route: string
  method: 'GET' | 'POST'
  path: (found: Found) => string
  form?: Record<string, string>
  answers: Answers
}

const get = (route: string, path: Row['path'], answers: Answers): Row => ({
  route,
  method: 'GET',
  path,
  answers,
})
const post = (route: string, path: Row['path'], form: Record<string, string>, answers: Answers): Row => ({
  route,
  method: 'POST',
  path,
  form,
  answers,
})

const open = { rest: 200 }
const onlyMembers = (answers: Partial<Record<Who, number>>): Answers => ({
  guest: 302,
  rest: 404,
  ...answers,
})
const anySecret = '0'.repeat(43)

/** URL × role × own and other organisation × method. An empty form stands for a form that is wrong: 400 means "may". */
const rows: Row[] = [
  get('', () => '/', open),
  get('crags', () => '/crags', open),
  get('crags/:slug', found => found.crag, open),
  get('climbs/:slug', found => found.climb, open),
  get('points/:code', found => `/points/${found.point}`, open),
  get('find', () => '/find?q=cold', open),
  get('notices', () => '/notices', open),
  get('notices/:code', found => `/notices/${found.notice}`, open),
  post(
    'notices/:code',
    found => `/notices/${found.notice}`,
    { do: 'confirm' },
    { guest: 302, 'access officer': 302, rest: 403 },
  ),
  get(
    'notices/new',
    found => `/notices/new?hazard=${found.hazard}`,
    onlyMembers({ 'access officer': 200, coordinator: 403 }),
  ),
  post(
    'notices/new',
    found => `/notices/new?hazard=${found.hazard}`,
    {},
    onlyMembers({ 'access officer': 400, coordinator: 403 }),
  ),
  get('about', () => '/about', open),
  get('hazards', () => '/hazards', {
    guest: 302,
    coordinator: 200,
    'other coordinator': 200,
    'access officer': 200,
    rest: 403,
  }),
  get(
    'hazards/:code',
    found => `/hazards/${found.hazard}`,
    onlyMembers({ coordinator: 200, 'access officer': 200 }),
  ),
  post(
    'hazards/:code',
    found => `/hazards/${found.hazard}`,
    {},
    onlyMembers({ coordinator: 409, 'access officer': 409 }),
  ),
  get(
    'reports/:id',
    found => `/reports/${found.report}`,
    onlyMembers({ coordinator: 200, 'access officer': 403 }),
  ),
  post(
    'reports/:id',
    found => `/reports/${found.report}`,
    {},
    onlyMembers({ coordinator: 400, 'access officer': 403 }),
  ),
  get('orders', () => '/orders', {
    guest: 302,
    climber: 403,
    'access officer': 403,
    'other admin': 403,
    rest: 200,
  }),
  get(
    'orders/new',
    found => `/orders/new?hazard=${found.hazard}`,
    onlyMembers({ coordinator: 200, 'access officer': 403 }),
  ),
  post(
    'orders/new',
    found => `/orders/new?hazard=${found.hazard}`,
    {},
    onlyMembers({ coordinator: 400, 'access officer': 403 }),
  ),
  get('orders/:code', found => `/orders/${found.order}`, onlyMembers({ coordinator: 200, rebolter: 200 })),
  post(
    'orders/:code',
    found => `/orders/${found.order}`,
    { do: 'offer' },
    onlyMembers({ coordinator: 400, rebolter: 403 }),
  ),
  get(
    'orders/:code/record',
    found => `/orders/${found.order}/record`,
    onlyMembers({ coordinator: 200, rebolter: 200 }),
  ),
  post(
    'orders/:code/record',
    found => `/orders/${found.order}/record`,
    {},
    onlyMembers({ coordinator: 400, rebolter: 400 }),
  ),
  get(
    'orders/:code/check',
    found => `/orders/${found.order}/check`,
    onlyMembers({ coordinator: 200, rebolter: 200 }),
  ),
  post(
    'orders/:code/check',
    found => `/orders/${found.order}/check`,
    {},
    onlyMembers({ coordinator: 400, rebolter: 400 }),
  ),
  get('status/:secret', () => `/status/${anySecret}`, { rest: 404 }),
  post('status/:secret', () => `/status/${anySecret}`, {}, { rest: 404 }),
  get('status/confirm/:secret', () => `/status/confirm/${anySecret}`, open),
  post('status/confirm/:secret', () => `/status/confirm/${anySecret}`, {}, { rest: 404 }),
  get('offers/:token', () => `/offers/${anySecret}`, { rest: 404 }),
  post('offers/:token', () => `/offers/${anySecret}`, { do: 'accept' }, { rest: 404 }),
  get('sheet/:token', () => `/sheet/${anySecret}`, { rest: 404 }),
  get('sign-in', () => '/sign-in', { guest: 200, rest: 302 }),
  post('sign-in', () => '/sign-in', {}, { guest: 400, rest: 302 }),
  get('account', () => '/account', { guest: 302, rest: 200 }),
  get('report', () => '/report', open),
  get('report/:climb', found => `/report/${found.climbCode}`, open),
  get('report/:climb/:point', found => `/report/${found.climbCode}/${found.point}`, open),
  post('report/:climb/:point', found => `/report/${found.climbCode}/${found.point}`, {}, { rest: 400 }),
  get('*', () => '/no-such-page', { rest: 404 }),
]

/** Pages whose answer hangs on the browser's own steps, walked through elsewhere. */
const walked = ['sign-in/code', 'sign-out']

async function readDemo(bram: Page, oona: Page): Promise<Found> {
  const href = async (page: Page, name: RegExp) =>
    (await page.getByRole('link', { name }).first().getAttribute('href'))!
  await bram.goto('/find?q=cold')
  const climb = await href(bram, /Cold Front/)
  await bram.goto('/hazards')
  const hazard = (await href(bram, /Cold Front/)).split('/').at(-1)!
  const report = (await href(bram, /Powder Monkey/)).split('/').at(-1)!
  await bram.goto(climb)
  const point = (await href(bram, /^HF-/)).split('/').at(-1)!
  const crag = await href(bram, /^Raven Quarry$/)
  await bram.goto(`/orders/new?hazard=${hazard}`)
  await bram.getByLabel('What is to be done').fill('Replace the bolt.')
  await bram.getByRole('button', { name: 'Make order' }).click()
  await bram.waitForURL(/orders\/HF/)
  const order = bram.url().split('/').at(-1)!
  await oona.goto(`/hazards/${hazard}`)
  await oona.getByRole('button', { name: 'Publish first warning' }).click()
  const notice = (await href(oona, /not reviewed/)).split('/').at(-1)!
  return { crag, climb, climbCode: climb.split('-').at(-1)!, point, hazard, report, order, notice }
}

test('Every URL answers every role of the own and of another organisation as the table says', async ({
  app,
  openBrowser,
}) => {
  const pages = new Map<Who, Page>()
  for (const name of everybody) {
    const page = await openBrowser()
    if (who[name] !== null) await signIn(page, app, who[name])
    else await page.goto('/sign-in')
    pages.set(name, page)
  }
  const found = await readDemo(pages.get('coordinator')!, pages.get('access officer')!)
  const wrong: string[] = []
  // what changes something comes last, and the wrong answers before the right one
  const order = [...everybody].sort((a, b) => Number(a === 'access officer') - Number(b === 'access officer'))
  for (const row of rows)
    for (const name of order) {
      const { request } = pages.get(name)!.context()
      const headers = { 'Sec-Fetch-Site': 'same-origin' }
      const path = row.path(found)
      const answer =
        row.method === 'GET'
          ? await request.get(path, { maxRedirects: 0 })
          : await request.post(path, { form: row.form, headers, maxRedirects: 0 })
      const want = row.answers[name] ?? row.answers.rest
      if (answer.status() !== want)
        wrong.push(`${row.method} ${path} for ${name}: ${answer.status()}, not ${want}`)
    }
  expect(wrong).toEqual([])
})

test('No URL is without a row in the table', async () => {
  const text = readFileSync(join(import.meta.dirname, '../../app/routes.ts'), 'utf8')
  const urls = ['', ...[...text.matchAll(/ route\('([^']+)'/g)].map(([, url]) => url!)]
  const covered = new Set([...rows.map(row => row.route), ...walked])
  expect(urls.filter(url => !covered.has(url))).toEqual([])
})

test('A form that comes from another site with our cookie changes nothing', async ({ app, page }) => {
  await signIn(page, app, 'bram@harrow.example')
  const { request } = page.context()
  const answer = await request.post('/sign-out', {
    headers: { Origin: 'https://elsewhere.example', 'Sec-Fetch-Site': 'cross-site' },
    maxRedirects: 0,
  })
  expect(answer.status()).toBe(403)
  expect((await request.get('/hazards', { maxRedirects: 0 })).status()).toBe(200)
})
