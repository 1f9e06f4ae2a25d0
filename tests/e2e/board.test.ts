import type { Browser, CDPSession, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { CounterList, type CounterRow } from '@shared/counters/schemas'
import { counterFaults } from '@shared/counters/faults'
import { toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'

/** One counter of three steps, drawn three times: by mouse, by touch, by keyboard alone. */
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

const fiba = rulePack('fiba')
const BLOCK = { x: 0.08, y: 0.663 }
const MIDDLE = { x: 0.34, y: 0.5 }
const FRONT = { x: 0.64, y: 0.5 }

/** Where a place of the court is on the screen, px. */
async function onScreen(page: Page, place: { x: number; y: number }) {
  const { x, y } = toMetres(fiba, place)
  return page.locator('svg[data-board]').evaluate(
    (svg, at) => {
      const matrix = (svg as SVGSVGElement).getScreenCTM()
      const point = new DOMPoint(at.x, at.y).matrixTransform(matrix ?? undefined)
      return { x: point.x, y: point.y }
    },
    { x, y },
  )
}

async function middleOf(page: Page, token: string) {
  const box = await page.locator(`[data-token="${token}"] .round`).boundingBox()
  if (!box) throw new Error(`no ${token}`)
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
}

type Pull = (from: { x: number; y: number }, to: { x: number; y: number }) => Promise<void>

const byMouse =
  (page: Page): Pull =>
  async (from, to) => {
    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    await page.mouse.move((from.x + to.x) / 2, (from.y + to.y) / 2)
    await page.mouse.move(to.x, to.y)
    await page.mouse.up()
  }

const byFinger =
  (cdp: CDPSession): Pull =>
  async (from, to) => {
    const touch = (type: 'touchStart' | 'touchMove' | 'touchEnd', at?: { x: number; y: number }) =>
      cdp.send('Input.dispatchTouchEvent', { type, touchPoints: at ? [at] : [] })
    await touch('touchStart', from)
    await touch('touchMove', { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 })
    await touch('touchMove', to)
    await touch('touchEnd')
  }

async function pullAll(page: Page, pull: Pull, newStep: () => Promise<void>): Promise<void> {
  const walk = async (token: string, to: { x: number; y: number }) =>
    pull(await middleOf(page, token), await onScreen(page, to))
  const pass = async (to: string) => pull(await middleOf(page, 'ball'), await middleOf(page, to))
  await page.evaluate(() => scrollTo(0, 0))
  await walk('token-1', BLOCK)
  await page.locator('[data-token="end-1"]').waitFor()
  await pass('end-1')
  await newStep()
  await walk('token-2', MIDDLE)
  await pass('end-2')
  await newStep()
  await walk('token-2', FRONT)
}

/** The one draft of the team, once the page says that it is kept. */
async function keptDraft(page: Page): Promise<CounterRow> {
  await page.getByText('Draft, kept.').waitFor()
  const id = /library\/([^/]+)\/draw/.exec(page.url())?.[1]
  const team = /\/t\/([^/]+)/.exec(page.url())?.[1] ?? ''
  const answer = await page.request.get(`/api/teams/${team}/counters?show=drafts`)
  const row = CounterList.parse(await answer.json()).rows.find((one) => one.id === id)
  if (!row) throw new Error('no draft was kept')
  return row
}

/** The same counter whatever drew it; places within half a metre, for hands differ. */
function expectThreeSteps({ diagram }: CounterRow): void {
  expect(counterFaults(diagram, ['fiba'])).toEqual([])
  expect(diagram.steps.map(({ moves }) => moves)).toMatchObject([
    [
      { kind: 'cut', who: '1', beat: 0 },
      { kind: 'pass', from: '5', to: '1', throwIn: true, beat: 1 },
    ],
    [
      { kind: 'cut', who: '2', beat: 0 },
      { kind: 'pass', from: '1', to: '2', throwIn: false, beat: 1 },
    ],
    [{ kind: 'dribble', who: '2', beat: 0 }],
  ])
  const ends = diagram.steps.flatMap(({ moves: [move] }) => (move && move.kind !== 'pass' ? [move.to] : []))
  for (const [i, wanted] of [BLOCK, MIDDLE, FRONT].entries()) {
    const [a, b] = [toMetres(fiba, ends[i] ?? { x: 9, y: 9 }), toMetres(fiba, wanted)]
    expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeLessThan(0.5)
  }
}

async function newBoard(page: Page): Promise<void> {
  await signIn(page, 'maren')
  const team = /\/t\/([^/]+)/.exec(page.url())?.[1] ?? ''
  await page.goto(`/t/${team}/library/new`)
  await page.locator('[data-token="token-1"]').waitFor()
}

describe('a counter of three steps', () => {
  it('is drawn by mouse, taken back and put in the book', async () => {
    const { page, faults } = await openPage(browser, product.url)
    await newBoard(page)
    await pullAll(page, byMouse(page), () => page.getByRole('button', { name: 'New step' }).click())
    expectThreeSteps(await keptDraft(page))
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText('2 dribbles').waitFor({ state: 'detached' })
    await page.getByRole('button', { name: 'Redo' }).click()
    await page.getByRole('button', { name: 'Put it in the book' }).click()
    await page.getByText('Give it a name.').waitFor()
    await page.getByLabel('Name', { exact: true }).fill('Harrow sweep')
    await page.getByLabel('Looks, in order').fill('2 in the middle')
    await page.getByRole('button', { name: 'Put it in the book' }).click()
    await page.getByText('In the book.').waitFor()
    expect(await seriousFaults(page)).toEqual([])
    expect(faults).toEqual([])
    await page.context().close()
  })

  it('is drawn by a finger on a phone', async () => {
    const { page, faults } = await openPage(browser, product.url, { width: 390, height: 844 })
    const cdp = await page.context().newCDPSession(page)
    await cdp.send('Emulation.setTouchEmulationEnabled', { enabled: true })
    await newBoard(page)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390)
    await pullAll(page, byFinger(cdp), () => page.getByRole('button', { name: 'New step' }).click())
    expectThreeSteps(await keptDraft(page))
    expect(await seriousFaults(page)).toEqual([])
    expect(faults).toEqual([])
    await page.context().close()
  })

  it('is drawn by keyboard alone: sentences by letters, a token by arrows', async () => {
    const { page, faults } = await openPage(browser, product.url)
    await newBoard(page)
    const keys = page.keyboard
    const tabTo = async (what: string, key = 'Tab') => {
      for (let i = 0; i < 60; i += 1) {
        await keys.press(key)
        const here = await page.evaluate(
          () =>
            document.activeElement?.getAttribute('data-token') ?? document.activeElement?.textContent?.trim(),
        )
        if (here === what) return
      }
      throw new Error(`Tab does not come to ${what}`)
    }
    await page.evaluate(() => (document.activeElement as HTMLElement | null)?.blur())
    await keys.type('1cd')
    await keys.type('5p1')
    await tabTo('New step')
    await keys.press('Enter')
    await keys.type('2ck')
    await tabTo('ball')
    await keys.press('2')
    await tabTo('New step', 'Shift+Tab')
    await keys.press('Enter')
    await tabTo('token-2')
    for (let i = 0; i < 17; i += 1) await keys.press('ArrowRight')
    await keys.press('Escape')
    for (let i = 0; i < 17; i += 1) await keys.press('ArrowRight')
    await keys.press('Enter')
    expectThreeSteps(await keptDraft(page))
    expect(faults).toEqual([])
    await page.context().close()
  })
})
