import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { execFileSync } from 'node:child_process'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'
import { settled, STAFF_PAGES, staffAddresses, type StaffPage } from '../support/staffPages'

/** A player with an account is erased: asked, stopped by somebody else, asked again, and gone everywhere after. */
let folder: string
let product: Product
let browser: Browser
let maren: Page
let sheets: string[] = []
let team = ''
const NAME = /Nell|Tavish/

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-erasure-'))
  product = await startProduct({}, join(folder, 'data'))
  browser = await launchBrowser()
  ;({ page: maren } = await openPage(browser, product.url))
  await signIn(maren, 'maren')
  team = /\/t\/([^/]+)/.exec(maren.url())?.[1] ?? ''
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
  await rm(folder, { recursive: true, force: true })
})

async function ask(): Promise<void> {
  await maren.goto(`/t/${team}/people`)
  const row = maren
    .getByRole('table', { name: 'Players' })
    .getByRole('row')
    .filter({ hasText: 'Nell Tavish' })
  await row.getByRole('button', { name: /^Erase/ }).click()
  const drawer = maren.getByRole('region', { name: /^Erase Nell/ })
  await drawer.getByText(/Goes for good/).waitFor()
  expect(await seriousFaults(maren)).toEqual([])
  await drawer.getByRole('button', { name: 'Erase', exact: true }).click()
  await maren
    .getByRole('list', { name: 'To be erased' })
    .getByText(/Nell.* is erased/)
    .waitFor()
}

async function paper(sheet: string): Promise<string> {
  const answer = await maren.request.get(`/api/teams/${team}/sheets/${sheet}.pdf`)
  // One that was called back is not drawn for anybody.
  if (answer.status() !== 200) return ''
  const file = join(folder, 'sheet.pdf')
  await writeFile(file, await answer.body())
  return execFileSync('pdftotext', [file, '-'], { encoding: 'utf8' })
}

describe('an erasure', () => {
  it('is asked for by the head coach, and stopped by anybody on the staff', async () => {
    await ask()
    const { page: tomas, faults } = await openPage(browser, product.url)
    await signIn(tomas, 'tomas')
    await tomas.goto(`/t/${team}/people`)
    await tomas.getByRole('button', { name: /^Stop it/ }).click()
    await tomas.getByRole('list', { name: 'To be erased' }).waitFor({ state: 'detached' })
    expect(faults).toEqual([])
    await tomas.context().close()
  })

  it('asked for again it waits for midnight, and she stays until then', async () => {
    await ask()
    const answer = await maren.request.get(`/api/teams/${team}/sheets`)
    sheets = ((await answer.json()) as { rows: { id: string }[] }).rows.map(({ id }) => id)
    expect((await Promise.all(sheets.map(paper))).join(' ')).toMatch(NAME)
  })

  it('after it no page and no paper of an old sheet has her name, and she cannot come in', async () => {
    await product.stop()
    // Midnight passes while the server stands still.
    const file = new Database(join(folder, 'data', 'overtop.sqlite'))
    const moved = file
      .prepare(`UPDATE erasures SET dueAt = '2026-01-01T00:00:00.000Z' WHERE stoppedAt IS NULL`)
      .run()
    file.close()
    expect(moved.changes).toBe(1)
    product = await startProduct({}, join(folder, 'data'))
    ;({ page: maren } = await openPage(browser, product.url))
    await signIn(maren, 'maren')
    await expect
      .poll(async () => (await maren.request.get(`/api/teams/${team}/people`)).text(), { timeout: 70_000 })
      .not.toMatch(NAME)
    const addressOf = await staffAddresses(maren)
    for (const name of Object.keys(STAFF_PAGES) as StaffPage[]) {
      await maren.goto(addressOf(name))
      await settled(maren)
      expect([name, NAME.exec(await maren.locator('body').innerText())?.[0] ?? null]).toEqual([name, null])
    }
    for (const sheet of sheets) expect(await paper(sheet)).not.toMatch(NAME)
    const { page: nell } = await openPage(browser, product.url, { width: 390, height: 844 })
    const answer = await nell.request.post('/api/session', {
      headers: { Origin: product.url },
      data: { email: 'nell@harrowcreek.example', password: 'over-the-top' },
    })
    expect(answer.status()).toBe(401)
  })
})
