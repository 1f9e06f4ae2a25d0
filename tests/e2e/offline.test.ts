import { randomUUID } from 'node:crypto'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'

/** A player's page in a hall without a signal: opened once, it opens again; whoever comes next finds nothing. */
let product: Product
let browser: Browser
let page: Page
let sheetPath: string

const PHONE = { width: 390, height: 844 }

/** Signs off a plan for the next game, as the head coach would, and returns the path of its sheet. */
async function handOut(): Promise<string> {
  const { page: coach } = await openPage(browser, product.url)
  await signIn(coach, 'maren')
  const [, team = ''] = /\/t\/([^/]+)/.exec(coach.url()) ?? []
  const api = (path: string) => `/api/teams/${team}${path}`
  const rows = async (path: string) =>
    ((await (await coach.request.get(api(path))).json()) as { rows: Record<string, string>[] }).rows
  const game = (await rows('/games')).find((row) => row['opponentName'] === 'Port Selby Gulls') ?? {}
  const [counter] = await rows('/counters')
  const ids = { planId: randomUUID(), sheetId: randomUUID() }
  const headers = { Origin: product.url }
  const put = await coach.request.put(api(`/games/${game['id']}/plan`), {
    headers,
    data: { id: ids.planId, firstCallId: counter?.['id'], keys: ['Look to the middle first.'] },
  })
  expect(put.status()).toBe(201)
  const signed = await coach.request.post(api(`/games/${game['id']}/plan/sign-off`), {
    headers: { ...headers, 'If-Match': '"1"' },
    data: ids,
  })
  expect(signed.status()).toBe(200)
  await coach.context().close()
  return `/t/${team}/sheets/${ids.sheetId}`
}

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
  sheetPath = await handOut()
  ;({ page } = await openPage(browser, product.url, PHONE, 'allow'))
  await signIn(page, 'nell')
  await page.evaluate(() => navigator.serviceWorker.ready)
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const kept = () =>
  page.evaluate(async () =>
    (await (await caches.open('overtop-kept')).keys()).map((request) => new URL(request.url).pathname),
  )

describe('a player without a signal', () => {
  it('opens again what was opened once, and says that it is a copy and how old', async () => {
    await page.goto(sheetPath)
    await page.getByRole('heading', { level: 1 }).waitFor()
    const words = await page.locator('main').innerText()
    await expect.poll(kept).toContain(`/api${sheetPath.replace('/t/', '/teams/')}`)

    await page.context().setOffline(true)
    await page.reload()
    await page.getByText('No signal.').waitFor()
    await page.getByText(/This is the copy from \d\d:\d\d\./).waitFor()
    const copy = await page.locator('main').innerText()
    for (const line of words.split('\n').filter((one) => one.length > 20)) expect(copy).toContain(line)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('keeps nothing of the record but what was handed out', async () => {
    for (const path of await kept()) expect(path).toMatch(/^\/api\/(session|teams\/[^/]+\/sheets(\/[^/]+)?)$/)
  })

  it('leaves nothing on the device after signing out', async () => {
    await page.context().setOffline(false)
    await page.goto('/')
    await page.evaluate(() => fetch('/api/session', { method: 'DELETE' }))
    await page.goto(sheetPath)
    await page.waitForURL(/sign-in/)
    await expect.poll(kept).toEqual([])
    await page.context().setOffline(true)
    await page.goto(sheetPath)
    await page.getByRole('heading', { level: 1, name: /signal/i }).waitFor()
  })
})
