import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'
import { settled, STAFF_PAGES, staffAddresses, type StaffPage } from '../support/staffPages'
import { routes } from '@/router/routes'

/** Every staff page at three widths: one h1, nothing wider than the screen, axe finds nothing serious. */
let product: Product
let browser: Browser
let page: Page
let faults: string[]
let addressOf: (name: StaffPage) => string

const WIDTHS = [
  [390, 844],
  [820, 1180],
  [1440, 900],
] as const

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
  ;({ page, faults } = await openPage(browser, product.url))
  await signIn(page, 'maren')
  addressOf = await staffAddresses(page)
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

/** Cells of one row whose words lie over each other, as "cell over cell"; words that nobody sees lie nowhere. */
const cellsOverCells = (): Promise<string[]> =>
  page.evaluate(() => {
    const seen = (text: Node): DOMRect[] => {
      const holder = text.parentElement
      if (!holder?.checkVisibility({ contentVisibilityAuto: true })) return []
      // Words for screen readers only stand in a box of one pixel.
      if (holder.closest('.sr-only') !== null) return []
      const range = document.createRange()
      range.selectNodeContents(text)
      return [...range.getClientRects()].filter(({ width, height }) => width > 0 && height > 0)
    }
    const wordsOf = (cell: Element) => {
      const texts = document.createTreeWalker(cell, NodeFilter.SHOW_TEXT)
      const boxes: DOMRect[] = []
      while (texts.nextNode())
        if (texts.currentNode.textContent?.trim()) boxes.push(...seen(texts.currentNode))
      return {
        left: Math.min(...boxes.map(({ left }) => left)),
        right: Math.max(...boxes.map(({ right }) => right)),
        top: Math.min(...boxes.map(({ top }) => top)),
        bottom: Math.max(...boxes.map(({ bottom }) => bottom)),
      }
    }
    return [...document.querySelectorAll('main tr')].flatMap((row) => {
      const cells = [...row.children].map((cell) => ({
        text: (cell.textContent ?? '').trim(),
        box: wordsOf(cell),
      }))
      return cells.flatMap((one, index) =>
        cells
          .slice(index + 1)
          .filter(
            ({ box }) =>
              Math.min(one.box.right, box.right) - Math.max(one.box.left, box.left) > 2 &&
              Math.min(one.box.bottom, box.bottom) - Math.max(one.box.top, box.top) > 2,
          )
          .map((other) => `${one.text} over ${other.text}`),
      )
    })
  })

it('every page of a team is in the list', () => {
  const team = routes.find(({ path }) => path === '/t/:team')?.children ?? []
  const patterns = team.filter(({ path, redirect }) => path !== '' && redirect === undefined)
  const missing = patterns.filter(({ path }) => {
    const shape = new RegExp(`^/t/[^/]+/${path.replace(/:\w+/g, '[^/]+')}$`)
    return !Object.values(STAFF_PAGES).some((address) => shape.test(address.split('?')[0] ?? ''))
  })
  expect(missing.map(({ path }) => path)).toEqual([])
  expect(patterns.length).toBeGreaterThan(15)
})

it.each(Object.keys(STAFF_PAGES) as StaffPage[])('%s, on a phone, a tablet and a desk', async (name) => {
  const [[phone, high]] = WIDTHS
  await page.setViewportSize({ width: phone, height: high })
  await page.goto(addressOf(name))
  for (const [width, height] of WIDTHS) {
    await page.setViewportSize({ width, height })
    await settled(page)
    expect(await page.locator('h1').count()).toBe(1)
    const wide = await page.evaluate(() => document.documentElement.scrollWidth)
    expect([width, wide <= width]).toEqual([width, true])
    expect([width, await cellsOverCells(), await seriousFaults(page)]).toEqual([width, [], []])
  }
})

it('the checker sees a fault that is put there', async () => {
  await page.evaluate(() => {
    const picture = document.createElement('img')
    picture.src = '/favicon.svg'
    document.querySelector('main')?.append(picture)
  })
  expect((await seriousFaults(page)).join()).toContain('image-alt')
})

describe('the ways in and out', () => {
  it('a page that does not exist says so and leads back', async () => {
    await page.goto(addressOf('week').replace('/week', '/nowhere'))
    await page.locator('main h1').waitFor()
    expect(await seriousFaults(page)).toEqual([])
  })

  it('a wrong password says what to do and keeps the address', async () => {
    const guest = await openPage(browser, product.url)
    await guest.page.goto(addressOf('read'))
    await guest.page.getByLabel('Email').fill('maren@harrowcreek.example')
    await guest.page.getByLabel('Password').fill('not this one')
    await guest.page.getByRole('button', { name: 'Sign in' }).click()
    await guest.page.getByText(/do not fit/).waitFor()
    expect(await guest.page.getByLabel('Email').inputValue()).toBe('maren@harrowcreek.example')
    expect(await seriousFaults(guest.page)).toEqual([])
    await guest.page.getByLabel('Password').fill('over-the-top')
    await guest.page.keyboard.press('Enter')
    await guest.page.getByRole('heading', { level: 1, name: /Port Selby Gulls/ }).waitFor()
    expect(guest.page.url()).toContain('/read')
  })

  it('a person of two teams chooses one, and sees nothing of the other in it', async () => {
    const priya = await openPage(browser, product.url)
    await priya.page.goto('/sign-in')
    await priya.page.getByLabel('Email').fill('priya@harrowcreek.example')
    await priya.page.getByLabel('Password').fill('over-the-top')
    await priya.page.keyboard.press('Enter')
    await priya.page.waitForURL(/\/teams/)
    expect(await seriousFaults(priya.page)).toEqual([])
    await priya.page.getByRole('link', { name: /U15/ }).first().click()
    await priya.page.waitForURL(/\/week/)
    await priya.page.locator('main h1').waitFor()
    await priya.page.waitForLoadState('networkidle')
    expect(await priya.page.getByText('Port Selby Gulls').count()).toBe(0)
    expect(await seriousFaults(priya.page)).toEqual([])
  })

  it('a player who opens a staff page is told who can', async () => {
    const nell = await openPage(browser, product.url, { width: 390, height: 844 })
    await signIn(nell.page, 'nell')
    await nell.page.goto(addressOf('read'))
    await nell.page.locator('main h1').waitFor()
    expect(await nell.page.getByText(/35 of 58/).count()).toBe(0)
    expect(await seriousFaults(nell.page)).toEqual([])
  })

  it('nothing went wrong behind the pages', () => {
    expect(faults).toEqual([])
  })
})
