import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'
import { staffAddresses, type StaffPage } from '../support/staffPages'

/** What was thrown away or changed in many rows at once comes back as it was. */
let product: Product
let browser: Browser
let page: Page
let faults: string[]
let addressOf: (name: StaffPage) => string

interface Row {
  id: string
  foe: string
  version: number
  updatedAt: string
  counts: { possessions: number }
}

beforeAll(async () => {
  product = await startProduct()
  browser = await launchBrowser()
  ;({ page, faults } = await openPage(browser, product.url))
  await signIn(page, 'tomas')
  addressOf = await staffAddresses(page)
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const apiOf = (name: StaffPage) => `/api${addressOf(name).replace('/t/', '/teams/')}`
const rowsAt = async <T>(path: string) =>
  ((await (await page.request.get(path)).json()) as { rows: T[] }).rows

it('a scouted game is thrown away, leaves every count, and is put back whole', async () => {
  const games = apiOf('scouted games')
  const counted = async () => {
    const answer = await page.request.get(apiOf('possessions'))
    return ((await answer.json()) as { of: number }).of
  }
  const before = await rowsAt<Row>(games)
  const all = await counted()
  const [game] = before
  if (!game) throw new Error('no scouted game to throw away')

  await page.goto(addressOf('scouted games'))
  await page
    .getByRole('button', { name: `Throw away the game against ${game.foe}` })
    .first()
    .click()
  const question = page.getByRole('dialog')
  await question.getByText(`With it go ${game.counts.possessions} possessions`).waitFor()
  expect(await seriousFaults(page)).toEqual([])
  await question.getByRole('button', { name: 'Throw it away' }).click()
  await page.getByText(/It can be put back for ten minutes/).waitFor()
  expect((await rowsAt<Row>(games)).map(({ id }) => id)).toEqual(before.slice(1).map(({ id }) => id))
  expect(await counted()).toBe(all - game.counts.possessions)

  await page.getByRole('button', { name: 'Put it back', exact: true }).click()
  await page
    .getByRole('button', { name: `Throw away the game against ${game.foe}` })
    .first()
    .waitFor()
  // It is another version of the row, with all that it held.
  const held = (rows: Row[]) => rows.map(({ version: _version, updatedAt: _at, ...row }) => row)
  expect(held(await rowsAt<Row>(games))).toEqual(held(before))
  expect(await counted()).toBe(all)
})

it('one change of many rows is made in one sentence and taken back in one click', async () => {
  await page.goto(addressOf('possessions'))
  const bar = page.getByRole('region', { name: 'Change the marked rows' })
  const marks = page.getByRole('checkbox', { name: /^Mark no\./ })
  await marks.first().waitFor()
  await page.getByRole('checkbox', { name: 'Mark all rows of this page' }).check()
  await bar.getByRole('button', { name: /^which column/ }).click()
  await bar.getByRole('button', { name: /^who had it/ }).click()
  // What most of the marked rows hold stands first, with how many.
  const held = bar.locator('.choices button').first()
  const [, many = ''] = /(\d+) rows?/.exec(await held.innerText()) ?? []
  await held.click()
  await bar.locator('.choices button').last().click()
  expect(await seriousFaults(page)).toEqual([])
  const rows = async () => {
    const answer = await page.request.get(`${apiOf('possessions')}?limit=50`)
    const { rows: all } = (await answer.json()) as {
      rows: { possession: { id: string; handler: unknown } }[]
    }
    return all.map(({ possession }) => [possession.id, possession.handler])
  }
  const before = await rows()
  await bar.getByRole('button', { name: `Change ${many} rows` }).click()
  const back = page.getByRole('button', { name: `Put all ${many} back` })
  await back.waitFor()
  const during = await rows()
  expect(during.filter(([, handler], at) => handler !== before[at]?.[1])).toHaveLength(Number(many))
  await back.click()
  await back.waitFor({ state: 'detached' })
  await expect.poll(rows, { timeout: 20_000 }).toEqual(before)
})

describe('behind it', () => {
  it('nothing went wrong', () => {
    expect(faults).toEqual([])
  })
})
