import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'

/** A counter of the library is found, walked by pointer and by keys, and printed. */
let product: Product
let browser: Browser
let page: Page
let faults: string[]

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
  ;({ page, faults } = await openPage(browser, product.url))
  await signIn(page, 'maren')
  await page.getByRole('link', { name: 'Library' }).click()
  await page.getByRole('table').waitFor()
}, 180_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const slider = () => page.getByRole('slider', { name: 'Count' })
const now = async () => Number(await slider().getAttribute('aria-valuenow'))
const sideways = () =>
  page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth)

describe('the library', () => {
  it('has nothing serious to axe, nor a sideways scroll on a phone', async () => {
    expect(await seriousFaults(page)).toEqual([])
    await page.setViewportSize({ width: 390, height: 844 })
    expect(await seriousFaults(page)).toEqual([])
    expect(await sideways()).toBe(false)
    await page.setViewportSize({ width: 1440, height: 900 })
  })

  it('is searched in its address', async () => {
    await page.getByRole('combobox', { name: 'The press it got us through' }).selectOption('2-2-1')
    await page.waitForURL(/beats=2-2-1/)
    expect(await page.getByRole('rowheader').count()).toBeGreaterThan(1)
    await page.getByRole('searchbox', { name: 'Find a counter' }).fill('nothing like it')
    await page.getByRole('button', { name: /Show all/ }).click()
    await page.getByRole('link', { name: '1-4 across' }).click()
    await slider().waitFor()
  })
})

describe('a counter', () => {
  it('is scrubbed with the pointer over the count ruler, and the address follows the step', async () => {
    const box = await slider().boundingBox()
    if (!box) throw new Error('no ruler')
    await page.mouse.move(box.x + 10, box.y + box.height / 2)
    await page.mouse.down()
    await page.mouse.move(box.x + box.width * 0.3, box.y + box.height / 2, { steps: 5 })
    await page.mouse.move(box.x + box.width * 0.45, box.y + box.height / 2, { steps: 5 })
    await page.mouse.up()
    expect(await now()).toBeGreaterThan(3)
    expect(await slider().getAttribute('aria-valuetext')).toMatch(/after the first touch/)
    await page.waitForURL(/step=[345]/)
  })

  it('shows stills by Space where little motion is asked for', async () => {
    await page.getByRole('button', { name: /^1 / }).first().click()
    expect(await now()).toBe(0)
    await page.getByRole('heading', { level: 1 }).focus()
    await page.keyboard.press('Space')
    await page.keyboard.press('Space')
    const still = await now()
    expect(still).toBeGreaterThan(0)
    await page.waitForTimeout(600)
    expect(await now()).toBe(still)
    expect(await page.locator('[aria-current=step]').textContent()).toContain('3')
  })

  it('lies over whatever opponent and court are chosen, in the address', async () => {
    await page.getByRole('combobox', { name: 'Against' }).selectOption('none')
    await page.waitForURL(/opponent=none/)
    expect(await page.locator('[data-part=trap-zones]').count()).toBe(0)
    await page.getByRole('combobox', { name: 'On' }).selectOption({ index: 1 })
    await page.waitForURL(/court=/)
  })

  it('has nothing serious to axe, also with the drawer open and on a phone', async () => {
    await page.getByRole('button', { name: 'What the walk assumes' }).click()
    expect(await seriousFaults(page)).toEqual([])
    await page.keyboard.press('Escape')
    await page.setViewportSize({ width: 390, height: 844 })
    expect(await seriousFaults(page)).toEqual([])
    expect(await sideways()).toBe(false)
    await page.setViewportSize({ width: 1440, height: 900 })
  })

  it('is printed', async () => {
    const href = await page.getByRole('link', { name: 'Print this one' }).getAttribute('href')
    const answer = await page.request.get(href ?? '')
    expect(answer.headers()['content-type']).toContain('application/pdf')
    expect(faults).toEqual([])
  })
})
