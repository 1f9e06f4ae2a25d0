import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'

/** Every staff page at three widths: one h1, nothing wider than the screen, axe finds nothing serious. */
let product: Product
let browser: Browser
let page: Page
let faults: string[]
let at: Record<string, string>

const WIDTHS = [
  [1440, 900],
  [820, 1180],
  [390, 844],
] as const

const PAGES = {
  week: '/t/{team}/week',
  opponents: '/t/{team}/opponents',
  'about an opponent': '/t/{team}/opponents/{opponent}/about',
  'scouted games': '/t/{team}/opponents/{opponent}/scouted-games',
  log: '/t/{team}/scouted-games/{scouted}/log',
  read: '/t/{team}/opponents/{opponent}/read',
  'read, a habit open': '/t/{team}/opponents/{opponent}/read?habit=press',
  choose: '/t/{team}/games/{game}/choose',
  'choose, nothing known': '/t/{team}/games/{unknown}/choose',
  library: '/t/{team}/library',
  rules: '/t/{team}/rules',
  counter: '/t/{team}/library/{counter}?step=1',
  squad: '/t/{team}/squad',
  sheets: '/t/{team}/sheets',
}

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
  ;({ page, faults } = await openPage(browser, product.url))
  await signIn(page, 'maren')
  const [, team = ''] = /\/t\/([^/]+)/.exec(page.url()) ?? []
  const rows = async (path: string) =>
    (
      (await (await page.request.get(`/api/teams/${team}${path}`)).json()) as {
        rows: Record<string, string>[]
      }
    ).rows
  const games = await rows('/games')
  const gulls = games.find((game) => game['opponentName'] === 'Port Selby Gulls') ?? {}
  const tarn = games.find((game) => game['opponentName'] === 'Tarn Valley') ?? {}
  const opponent = gulls['opponentId'] ?? ''
  at = {
    team,
    opponent,
    game: gulls['id'] ?? '',
    unknown: tarn['id'] ?? '',
    scouted: (await rows(`/opponents/${opponent}/scouted-games`))[0]?.['id'] ?? '',
    counter: (await rows('/counters'))[0]?.['id'] ?? '',
  }
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const address = (pattern: string) => pattern.replace(/\{(\w+)\}/g, (_, name: string) => at[name] ?? '')

async function settled(): Promise<void> {
  await page.locator('main h1').first().waitFor()
  await page.waitForLoadState('networkidle')
  await page.locator('[aria-busy="true"]').first().waitFor({ state: 'detached' })
}

/** Cells of one row whose words lie over each other, as "cell over cell". */
const cellsOverCells = (): Promise<string[]> =>
  page.evaluate(() =>
    [...document.querySelectorAll('main tr')].flatMap((row) => {
      const cells = [...row.children].map((cell) => {
        const words = document.createRange()
        words.selectNodeContents(cell)
        return { text: (cell.textContent ?? '').trim(), box: words.getBoundingClientRect() }
      })
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
    }),
  )

describe.each(WIDTHS)('at %d x %d', (width, height) => {
  it.each(Object.keys(PAGES) as (keyof typeof PAGES)[])('%s', async (name) => {
    await page.setViewportSize({ width, height })
    await page.goto(address(PAGES[name]))
    await settled()
    expect(await page.locator('h1').count()).toBe(1)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width)
    expect(await cellsOverCells()).toEqual([])
    expect(await seriousFaults(page)).toEqual([])
  })
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
    await page.goto(`/t/${at['team']}/nowhere`)
    await page.locator('main h1').waitFor()
    expect(await seriousFaults(page)).toEqual([])
  })

  it('a wrong password says what to do and keeps the address', async () => {
    const guest = await openPage(browser, product.url)
    await guest.page.goto(address(PAGES.read))
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
    await nell.page.goto(address(PAGES.read))
    await nell.page.locator('main h1').waitFor()
    expect(await nell.page.getByText(/35 of 58/).count()).toBe(0)
    expect(await seriousFaults(nell.page)).toEqual([])
  })

  it('nothing went wrong behind the pages', () => {
    expect(faults).toEqual([])
  })
})
