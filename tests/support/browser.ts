import { readFileSync } from 'node:fs'
import { chromium, type Browser, type Page } from 'playwright-core'

/** Debian's Chromium, without the services that ask the outside. */
export const launchBrowser = (): Promise<Browser> =>
  chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })

/**
 * A page of its own session that keeps what went wrong in it. The worker stays out unless it is what is looked
 * at: it would answer in the place of a server that a test has cut off.
 */
export async function openPage(
  browser: Browser,
  baseURL: string,
  viewport = { width: 1440, height: 900 },
  serviceWorkers: 'allow' | 'block' = 'block',
): Promise<{ page: Page; faults: string[] }> {
  const context = await browser.newContext({ baseURL, viewport, reducedMotion: 'reduce', serviceWorkers })
  const page = await context.newPage()
  page.setDefaultTimeout(15_000)
  const faults: string[] = []
  page.on('pageerror', (error) => faults.push(error.message))
  page.on('console', (message) => {
    // Being asked to sign in is an answer, not a fault; Chromium reports every 4xx as an error.
    if (message.type() === 'error' && !/status of 401/.test(message.text())) faults.push(message.text())
  })
  return { page, faults }
}

/** Signs in by the form, as a person would. */
export async function signIn(page: Page, name: string): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('Email').fill(`${name}@harrowcreek.example`)
  await page.getByLabel('Password').fill('over-the-top')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL((url) => url.pathname.startsWith('/t/'))
}

const AXE = readFileSync('node_modules/axe-core/axe.min.js', 'utf8')

/** What axe finds serious or critical, as "rule: selector". */
export async function seriousFaults(page: Page): Promise<string[]> {
  await page.evaluate(AXE)
  return page.evaluate(async () => {
    const { axe } = window as unknown as {
      axe: {
        run: () => Promise<{ violations: { id: string; impact: string; nodes: { target: unknown[] }[] }[] }>
      }
    }
    const { violations } = await axe.run()
    return violations
      .filter(({ impact }) => impact === 'serious' || impact === 'critical')
      .flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`))
  })
}
