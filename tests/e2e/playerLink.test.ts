import { execFileSync } from 'node:child_process'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'

/** A player's way from the link in her letter to the paper, and what she is told when the sheet is called back. */
let product: Product
let browser: Browser
let folder: string
let maren: { page: Page; faults: string[] }
let nell: { page: Page; faults: string[] }
let team = ''
let sheet: { id: string; gameId: string; planNumber: number }
let letterLink = ''

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-link-'))
  product = await startProduct()
  browser = await launchBrowser()
  maren = await openPage(browser, product.url)
  nell = await openPage(browser, product.url, { width: 390, height: 844 })
  await signIn(maren.page, 'maren')
  team = /\/t\/([^/]+)/.exec(maren.page.url())?.[1] ?? ''
  const answer = await maren.page.request.get(`/api/teams/${team}/sheets`)
  const { rows } = (await answer.json()) as { rows: (typeof sheet & { recalledAt: string | null })[] }
  const [newest] = rows.filter(({ recalledAt }) => recalledAt === null)
  if (!newest) throw new Error('the demo has no sheet out')
  sheet = newest
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
  await rm(folder, { recursive: true, force: true })
})

async function wordsOf(page: Page, path: string): Promise<string> {
  const answer = await page.request.get(`/api/teams/${team}${path}`)
  expect([answer.status(), answer.headers()['content-type']]).toEqual([200, 'application/pdf'])
  const file = join(folder, 'sheet.pdf')
  await writeFile(file, await answer.body())
  return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' })
}

describe('a player and her link', () => {
  it('without a mail server the letter is kept, and its link stands in the words that the staff can copy', async () => {
    const { page } = maren
    await page.goto(`/t/${team}/games/${sheet.gameId}/teach`)
    const mail = page.getByRole('button', { name: /^Mail (version|it to the .* players?$)/ }).first()
    await page.getByRole('heading', { name: 'By mail' }).waitFor()
    if ((await mail.count()) > 0) {
      const sent = page.waitForResponse((answer) => answer.url().endsWith('/letters'))
      await mail.click()
      expect((await sent).ok()).toBe(true)
    }
    await page.goto(`/t/${team}/letters`)
    const row = page.getByRole('row').filter({ hasText: 'nell@harrowcreek.example' }).first()
    await row.getByText('Kept here').waitFor()
    await row.getByText('The words', { exact: true }).click()
    const words = await row.locator('pre').innerText()
    expect(words).toContain('Nell')
    const [address = ''] = /https?:\/\/\S+\/sheets\/[\w-]+/.exec(words) ?? []
    letterLink = new URL(address).pathname
    expect(letterLink).toBe(`/t/${team}/sheets/${sheet.id}`)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('asks her to sign in, and opens the sheet that it names', async () => {
    const { page } = nell
    await page.goto(letterLink)
    await page.waitForURL(/sign-in/)
    await page.getByLabel('Email').fill('nell@harrowcreek.example')
    await page.getByLabel('Password').fill('over-the-top')
    await page.keyboard.press('Enter')
    await page.waitForURL((url) => url.pathname === letterLink)
    await page
      .getByText(/They trap|They press/)
      .first()
      .waitFor()
    expect(await seriousFaults(page)).toEqual([])
  })

  it('and the paper behind it is her own: her role, nobody’s last name', async () => {
    const words = await wordsOf(nell.page, `/sheets/${sheet.id}.pdf`)
    expect(words).toMatch(/Nell,/)
    expect(words).toMatch(/you are \d/i)
    for (const last of ['Tavish', 'Castell', 'Ashgrove', 'Boyce', 'Verran']) expect(words).not.toContain(last)
    const numbered = await maren.page.request.get(`/api/teams/${team}/sheets/${sheet.id}/copies`)
    const { rows } = (await numbered.json()) as { rows: { number: number | null; way: string }[] }
    const numbers = rows.filter(({ way }) => way === 'paper').map(({ number }) => number ?? 0)
    expect(numbers.length).toBeGreaterThan(0)
    const papers = await wordsOf(maren.page, `/sheets/${sheet.id}/copies.pdf`)
    for (const number of numbers) expect(papers).toMatch(new RegExp(`\\b${number}\\b`))
    expect(papers).not.toContain('Tavish')
  })

  it('the staff see that she opened it, and she does not', async () => {
    const { page } = maren
    await page.goto(`/t/${team}/games/${sheet.gameId}/teach`)
    await page.getByText('4, Nell has this version').waitFor({ state: 'attached' })
    const asked = await nell.page.request.get(`/api/teams/${team}/sheets/${sheet.id}/openings`)
    expect(asked.status()).toBe(403)
    expect(await nell.page.getByText(/opened it|has this version/).count()).toBe(0)
  })

  it('called back, it says so to her, and can no longer be printed', async () => {
    const { page } = maren
    await page.getByRole('button', { name: `Call back version ${sheet.planNumber}` }).click()
    const question = page.getByRole('dialog')
    expect(await seriousFaults(page)).toEqual([])
    await question.getByRole('button', { name: 'Call it back' }).click()
    await page.getByText(`Version ${sheet.planNumber} is called back.`).waitFor()
    await nell.page.reload()
    await nell.page.getByText('This one is called back.').waitFor()
    expect(await seriousFaults(nell.page)).toEqual([])
    const paper = (reader: Page) => reader.request.get(`/api/teams/${team}/sheets/${sheet.id}.pdf`)
    expect((await paper(nell.page)).status()).toBe(410)
    // The staff may still see what was out.
    expect((await paper(page)).status()).toBe(200)
  })

  it('nothing went wrong in either browser', () => {
    expect([nell.faults, maren.faults]).toEqual([[], []])
  })
})
