import { setTimeout as pause } from 'node:timers/promises'
import { AxeBuilder } from '@axe-core/playwright'
import { type BrowserContext, test as base, expect, type Page } from '@playwright/test'
import { findFreePort } from '../../app/commands/ports.mjs'
import type { Settings } from '../../app/web/settings'
import { type FakeMail, type Letter, start as startMail } from '../../fakes/mail/server'
import { groundFile } from './build.global'
import { type DemoServer, dawn, startDemoServer } from './demo-database'
import { endTask, startTask } from './tasks'

export { expect }

export interface FreshApp {
  url: string
  mail: {
    /** the oldest mail to that address with that subject which no earlier call has given; waits for it up to 15 s */
    waitFor(wanted: { to: string; subject: RegExp | string }): Promise<Letter>
    fake: FakeMail
  }
  database: { stop(): Promise<void>; start(): Promise<void> }
  /** what the server has logged */
  log(): string
}

interface Journey {
  app: FreshApp
  /** another person's browser, with a cookie jar of its own, at the same size of window */
  openBrowser(options?: { javaScriptEnabled?: boolean }): Promise<Page>
  /** lets errors in the browser's console that match pass; every other one fails the journey */
  announce(pattern: RegExp): void
  consoleErrors: { said: string[]; announced: RegExp[]; watch(context: BrowserContext): void }
}

/** A journey against the production build with a demo, photos and an inbox of its own. */
export const test = base.extend<Journey, { demo: DemoServer }>({
  demo: [
    // biome-ignore lint/correctness/noEmptyPattern: the framework reads the names of the fixtures from the pattern
    async ({}, use) => {
      const demo = await startDemoServer()
      await use(demo)
      await demo.close()
    },
    { scope: 'worker', timeout: 120_000 },
  ],
  app: async ({ demo }, use, info) => {
    const { app, close } = await startFreshApp(demo)
    await use(app)
    if (info.status !== info.expectedStatus) await info.attach('server.log', { body: app.log() })
    await close()
  },
  baseURL: async ({ app }, use) => use(app.url),
  // biome-ignore lint/correctness/noEmptyPattern: as above
  consoleErrors: async ({}, use) => {
    const said: string[] = []
    const announced: RegExp[] = []
    await use({
      said,
      announced,
      watch(context) {
        context.on('console', message => {
          if (message.type() === 'error') said.push(`${message.text()} (${message.location().url})`)
        })
        context.on('weberror', event => said.push(String(event.error().stack)))
      },
    })
    expect(
      said.filter(words => !announced.some(pattern => pattern.test(words))),
      'errors in the console that were not announced',
    ).toEqual([])
  },
  announce: async ({ consoleErrors }, use) => use(pattern => void consoleErrors.announced.push(pattern)),
  context: async ({ context, consoleErrors }, use) => {
    consoleErrors.watch(context)
    await use(context)
  },
  openBrowser: async ({ browser, app, consoleErrors, contextOptions, viewport, hasTouch, isMobile }, use) => {
    const contexts: BrowserContext[] = []
    await use(async (options = {}) => {
      const context = await browser.newContext({
        ...contextOptions,
        viewport,
        hasTouch,
        isMobile,
        baseURL: app.url,
        ...options,
      })
      contexts.push(context)
      consoleErrors.watch(context)
      return context.newPage()
    })
    for (const context of contexts) await context.close()
  },
})

async function startFreshApp(demo: DemoServer): Promise<{ app: FreshApp; close(): Promise<void> }> {
  const [copy, fake, port] = await Promise.all([demo.copy(), startMail(), findFreePort()])
  const settings: Settings = {
    port,
    host: '127.0.0.1',
    appUrl: `http://127.0.0.1:${port}`,
    dataDir: copy.photoDir,
    databaseUrl: copy.databaseUrl,
    smtpUrl: fake.smtpUrl,
    mailFrom: 'Cragfettle <gear@skerrow.example>',
    photoDir: copy.photoDir,
    appSecret: 'a secret of the journeys, 32 characters and more',
    trustProxy: false,
    operatorEmail: null,
    clockAt: dawn,
    groundFile,
    demo: true,
    production: true,
  }
  const { child, log } = await startTask('serve', settings)
  const app = {
    url: settings.appUrl,
    mail: { fake, waitFor: waiting(fake) },
    database: { stop: demo.stop, start: demo.start },
    log,
  }
  return {
    app,
    async close() {
      await endTask(child)
      await fake.close()
      await copy.drop()
    },
  }
}

function waiting(fake: FakeMail): FreshApp['mail']['waitFor'] {
  const given = new Set<number>()
  return async ({ to, subject }) => {
    const fits = (letter: Letter) =>
      !given.has(letter.id) &&
      letter.to.includes(to) &&
      (typeof subject === 'string' ? letter.subject.includes(subject) : subject.test(letter.subject))
    for (let tries = 0; tries < 300; tries++) {
      const found = fake.seen().find(fits)
      if (found !== undefined) {
        given.add(found.id)
        return found
      }
      await pause(50)
    }
    const came = fake.seen().map(letter => `${letter.to.join(', ')}: ${letter.subject}`)
    throw new Error(`No mail to ${to} about ${subject} came within 15 s. There were:\n${came.join('\n')}`)
  }
}

/** Asserts that axe finds nothing wrong with the page as it stands, by WCAG 2.2 A and AA. */
export async function axe(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'])
    .analyze()
  const words = violations.map(
    ({ id, help, nodes }) => `${id}: ${help}: ${nodes.map(node => node.html).join(' | ')}`,
  )
  expect(words, `what axe finds on ${page.url()}`).toEqual([])
}
