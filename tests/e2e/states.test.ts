import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'
import { settled, STAFF_PAGES, staffAddresses, type StaffPage } from '../support/staffPages'

/** What a staff page says when nothing can be fetched, and when there is nothing to fetch yet. */
let product: Product
let browser: Browser

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const mainWords = async (page: Page) => (await page.locator('main').innerText()).replace(/\s+/g, ' ')

describe('with every request of the page refused', () => {
  let page: Page
  let addressOf: (name: StaffPage) => string
  beforeAll(async () => {
    ;({ page } = await openPage(browser, product.url, { width: 390, height: 844 }))
    await signIn(page, 'maren')
    addressOf = await staffAddresses(page)
    const broken = { status: 500, contentType: 'application/problem+json', body: '{"status":500}' }
    await page.route(/\/api\/(teams\/|session\/account)/, (route) => route.fulfill(broken))
  })

  // A drawing is begun on the page itself: nothing is fetched before the first move is kept.
  const fetched = (Object.keys(STAFF_PAGES) as StaffPage[]).filter((name) => name !== 'a new counter')
  it.each(fetched)('%s says so, what is safe, and lets try again', async (name) => {
    await page.goto(addressOf(name))
    await page
      .getByText(/did not open/)
      .first()
      .waitFor()
    const words = await mainWords(page)
    expect(words).toMatch(
      /safe|kept|holds the same|nothing (else )?was|still in|all the same|as (it|they) (was|were)/i,
    )
    expect(words).not.toMatch(/undefined|NaN|\[object|500|Internal/)
    expect(await page.getByRole('button', { name: /again/ }).count()).toBeGreaterThan(0)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390)
    expect(await seriousFaults(page)).toEqual([])
  })
})

describe('with nothing in it yet', () => {
  let page: Page
  let faults: string[]
  let team: string
  beforeAll(async () => {
    ;({ page, faults } = await openPage(browser, product.url, { width: 390, height: 844 }))
    await signIn(page, 'ines')
    team = /\/t\/([^/]+)/.exec(page.url())?.[1] ?? ''
  })
  const alone = (Object.keys(STAFF_PAGES) as StaffPage[]).filter(
    (name) => !/\{(?!team)/.test(STAFF_PAGES[name]),
  )

  it.each(alone)('%s stands, and says what comes first', async (name) => {
    await page.goto(STAFF_PAGES[name].replace('{team}', team))
    await settled(page)
    const words = await mainWords(page)
    expect(words.length).toBeGreaterThan(20)
    expect(words).not.toMatch(/undefined|NaN|\[object|did not open|Gulls|Nell/)
    expect(await page.locator('h1').count()).toBe(1)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('and nothing went wrong behind it', () => {
    expect(faults).toEqual([])
  })
})
