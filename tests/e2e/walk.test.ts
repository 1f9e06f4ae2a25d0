import { execFileSync } from 'node:child_process'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { jpeg } from '../support/fixture'
import { startProduct, type Product } from '../support/product'

/** The main job once, as three people in three browsers: log, read, choose, sign off, open. */
let product: Product
let browser: Browser
let folder: string
let tomas: { page: Page; faults: string[] }
let maren: { page: Page; faults: string[] }
let nell: { page: Page; faults: string[] }

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-walk-'))
  product = await startProduct()
  browser = await launchBrowser()
  tomas = await openPage(browser, product.url)
  maren = await openPage(browser, product.url)
  nell = await openPage(browser, product.url, { width: 390, height: 844 })
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
  await rm(folder, { recursive: true, force: true })
})

/** The count beside a habit on the read, e.g. "35 of 58". */
const countOf = async (page: Page, habit: string): Promise<string> => {
  const row = page
    .getByRole('listitem')
    .filter({ has: page.getByText(habit, { exact: true }) })
    .first()
  await row.waitFor()
  const [count = ''] = /\d+\s*of\s*\d+/.exec((await row.innerText()).replace(/\s+/g, ' ')) ?? []
  return count.replace(/\s*of\s*/, ' of ')
}

const text = (args: string[], file: string) =>
  execFileSync('pdftotext', [...args, file, '-'], { encoding: 'utf8' })

describe('one possession to one printed sheet', () => {
  it('says where it is and who may sign in', () => {
    expect(product.printed()).toContain('maren@harrowcreek.example')
    expect(product.printed()).toContain('over-the-top')
  })

  it('an assistant coach reads, logs a possession with a still by keyboard and tap, and the count moves', async () => {
    const { page } = tomas
    await signIn(page, 'tomas')
    await page.getByRole('heading', { level: 1, name: /Port Selby Gulls/ }).waitFor()
    expect(await seriousFaults(page)).toEqual([])
    await page.getByRole('link', { name: 'Opponents', exact: true }).click()
    await page
      .getByRole('link', { name: /^Port Selby Gulls/ })
      .first()
      .click()
    await page.getByRole('heading', { level: 1, name: /Port Selby Gulls/ }).waitFor()
    expect(await countOf(page, 'Press')).toBe('35 of 58')
    expect(await seriousFaults(page)).toEqual([])

    await page.getByRole('link', { name: /Scout/ }).first().click()
    await page
      .getByRole('link', { name: /Tarn Valley/ })
      .first()
      .click()
    await page
      .getByText('No. 25', { exact: false })
      .or(page.getByText('25', { exact: true }))
      .first()
      .waitFor()
    await page.getByRole('button', { name: /Made basket/ }).waitFor()
    await page.keyboard.press('1')
    await page
      .getByRole('button', { name: /1-2-1-1/ })
      .first()
      .waitFor()
    await page.keyboard.press('2')
    await page
      .getByRole('button', { name: /Full court/ })
      .first()
      .waitFor()
    await page.keyboard.press('1')
    await page.getByRole('button', { name: /No trap/ }).waitFor()
    const court = await page
      .getByRole('main')
      .locator('svg')
      .filter({ hasText: 'over half by' })
      .first()
      .boundingBox()
    if (!court) throw new Error('no court to tap')
    await page.mouse.click(court.x + court.width * 0.08, court.y + court.height * 0.93)
    await page
      .getByRole('button', { name: /right deep corner/ })
      .first()
      .waitFor()
    await page.keyboard.press('4')
    const still = join(folder, 'still.jpg')
    await writeFile(still, await jpeg(1600, 900))
    await page.getByLabel('Pictures for this possession').setInputFiles(still)
    expect(await seriousFaults(page)).toEqual([])
    const sent = page.waitForResponse(
      (answer) => answer.url().includes('/stills/') && answer.request().method() === 'PUT',
    )
    await page.keyboard.press('Enter')
    expect((await sent).status()).toBe(201)
    await page.getByText(/No\. 25 saved/).waitFor()

    await page.goto(page.url().replace(/\/scouted-games\/.*/, '/opponents'))
    await page
      .getByRole('link', { name: /Port Selby Gulls/ })
      .first()
      .click()
    await page.getByRole('heading', { level: 1, name: /Port Selby Gulls/ }).waitFor()
    expect(await countOf(page, 'Press')).toBe('36 of 59')
  })

  it('a habit opens the possessions behind it, and the address can be shared', async () => {
    const { page } = tomas
    await page
      .getByRole('button', { name: /First trap on the catch/ })
      .first()
      .click()
    await page
      .getByText(/16 of 24/)
      .first()
      .waitFor()
    expect(page.url()).toContain('habit=')
    const shared = page.url()
    await page.goto('/')
    await page.goto(shared)
    await page
      .getByRole('heading', { name: /First trap on the catch/ })
      .first()
      .waitFor()
  })

  it('the assistant sees the choice but cannot pick', async () => {
    const { page } = tomas
    await page
      .getByRole('link', { name: /Choose/ })
      .first()
      .click()
    await page.getByRole('heading', { name: /best first/ }).waitFor()
    expect(await page.getByRole('radio', { name: 'First call' }).count()).toBe(0)
    expect(await page.getByRole('button', { name: /Sign off/ }).count()).toBe(0)
  })

  it('the head coach picks, writes a key and signs off', async () => {
    const { page } = maren
    await signIn(page, 'maren')
    await page.getByRole('link', { name: 'Opponents', exact: true }).click()
    await page
      .getByRole('link', { name: /^Port Selby Gulls/ })
      .first()
      .click()
    await page
      .getByRole('link', { name: /Choose/ })
      .first()
      .click()
    await page.getByRole('heading', { name: /best first/ }).waitFor()
    expect(await seriousFaults(page)).toEqual([])
    const saved = () =>
      page.waitForResponse((answer) => answer.url().endsWith('/plan') && answer.request().method() === 'PUT')
    let answer = saved()
    await page.getByText('First call', { exact: true }).first().click()
    expect((await answer).ok()).toBe(true)
    answer = saved()
    await page.getByText('Change-up', { exact: true }).nth(1).click()
    expect((await answer).ok()).toBe(true)
    answer = saved()
    await page.getByRole('textbox', { name: /key/i }).first().fill('Don’t dribble into two.')
    await page.keyboard.press('Tab')
    expect((await answer).ok()).toBe(true)
    await page.getByRole('button', { name: /Sign off and make the sheet/ }).click()
    const question = page.getByRole('dialog').or(page.getByRole('alertdialog'))
    await question.getByRole('button', { name: /Sign off/ }).click()
    await page.waitForURL(/\/sheets\//)
    await page
      .getByText(/of 120/)
      .first()
      .waitFor()
    expect(await seriousFaults(page)).toEqual([])
  })

  it('a player opens her page on a phone', async () => {
    const { page } = nell
    await signIn(page, 'nell')
    await page.getByRole('heading', { name: 'Port Selby Gulls' }).waitFor()
    await page.getByRole('link', { name: 'Open your sheet' }).click()
    await page
      .getByText(/They trap/)
      .first()
      .waitFor()
    expect(await seriousFaults(page)).toEqual([])
    await page
      .getByRole('tab', { name: 'My job' })
      .or(page.getByRole('link', { name: 'My job' }))
      .first()
      .click()
    await page
      .getByText(/You are \d/)
      .first()
      .waitFor()
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390)
    expect(await seriousFaults(page)).toEqual([])
  })

  it.each(['a4', 'letter'] as const)(
    'and the printed page is one page of %s that says the same',
    async (paper) => {
      const { page } = nell
      const [, team = '', sheet = ''] = /\/t\/([^/]+)\/sheets\/([^/?]+)/.exec(page.url()) ?? []
      const answer = await page.request.get(`/api/teams/${team}/sheets/${sheet}.pdf?paper=${paper}`)
      expect(answer.status()).toBe(200)
      expect(answer.headers()['content-type']).toBe('application/pdf')
      const file = join(folder, `${paper}.pdf`)
      await writeFile(file, await answer.body())
      const info = execFileSync('pdfinfo', [file], { encoding: 'utf8' })
      expect(info).toMatch(/Pages:\s+1\n/)
      expect(info).toMatch(paper === 'a4' ? /595\.\d+ x 841\.\d+/ : /612 x 792/)
      const words = text(['-layout'], file)
      expect(words).toContain('Port Selby Gulls')
      expect(words).toContain('Don’t dribble into two.')
      expect(words).toMatch(/Nell,/)
      expect(words).not.toContain('Tavish')
      expect(words).toMatch(/\d+ of \d+/)
    },
  )

  it('nothing went wrong in any of the three browsers', () => {
    expect([tomas.faults, maren.faults, nell.faults]).toEqual([[], [], []])
  })
})
