import { randomUUID } from 'node:crypto'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults } from '../support/browser'
import { jpeg } from '../support/fixture'
import { startProduct, type Product } from '../support/product'

/** A new club from an empty folder to the first sheet on a phone, by three people in three browsers. */
let product: Product
let browser: Browser
let ada: { page: Page; faults: string[] }
let bo: { page: Page; faults: string[] }
let wren: { page: Page; faults: string[] }
const PASSWORD = 'nine tall otters'
let sheetPath = ''

beforeAll(async () => {
  product = await startProduct({ DEMO: 'off' })
  browser = await launchBrowser()
  ada = await openPage(browser, product.url)
  bo = await openPage(browser, product.url)
  wren = await openPage(browser, product.url, { width: 390, height: 844 })
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const link = (page: Page, name: string | RegExp) => page.getByRole('link', { name }).first().click()

/** Says an invitation's sentence and returns the link that it makes, told once. */
async function invite(page: Page, role: RegExp, player?: RegExp): Promise<string> {
  await link(page, 'Squad')
  await link(page, 'People')
  const side = page.getByRole('region', { name: 'Bring someone in' })
  for (const word of [role, ...(player ? [player] : []), /^a link I copy$/, /week|days/])
    await side.locator('.choices').getByRole('button', { name: word }).first().click()
  await side.getByRole('button', { name: 'Make the link' }).click()
  const made = side.getByLabel('The link, told this once')
  await made.waitFor()
  // The server under test took any free port; the address behind it is what the link is about.
  const { pathname, hash } = new URL(await made.inputValue())
  return pathname + hash
}

async function join(page: Page, address: string, name: string, email: string): Promise<void> {
  await page.goto(address)
  await page.getByLabel('Your name').fill(name)
  await page.getByLabel('Email').fill(email)
  await page.getByLabel('Choose a password').fill(PASSWORD)
  expect(await seriousFaults(page)).toEqual([])
  await page.getByRole('button', { name: 'Join', exact: true }).click()
  await page.waitForURL(/\/t\//)
}

describe('a new club', () => {
  it('is set up by its first head coach from the address that the server printed', async () => {
    const [, path = ''] =
      /Set the first one up at http:\/\/[^/]+(\/first-run#\S+)/.exec(product.printed()) ?? []
    const { page } = ada
    await page.goto(path.replace(/\.$/, ''))
    await page.getByLabel('Name of the team').fill('Saltmarsh Otters')
    await page.getByLabel(/Who they are/).fill('U17 girls')
    await page.getByLabel(/Time zone/).fill('Europe/London')
    await page.getByLabel('Your name').fill('Ada Fennimore')
    await page.getByLabel('Email').fill('ada@club.example')
    await page.getByLabel('Choose a password').fill(PASSWORD)
    expect(await seriousFaults(page)).toEqual([])
    await page.getByRole('button', { name: 'Set it up' }).click()
    await page.waitForURL(/\/week/)
    await page.locator('main h1').waitFor()
    // The address has done its work.
    const guest = await openPage(browser, product.url)
    const again = await guest.page.request.post('/api/first-coach', {
      headers: { Origin: product.url },
      data: { token: path.split('#')[1], name: 'Eve' },
    })
    expect(again.status()).toBeGreaterThanOrEqual(400)
    await guest.page.context().close()
  })

  it('asks an assistant in by a link, which works once', async () => {
    const address = await invite(ada.page, /^Assistant coach/i)
    await join(bo.page, address, 'Bo Tarrant', 'bo@club.example')
    const late = await openPage(browser, product.url)
    await late.page.goto(address)
    await late.page.getByRole('heading', { name: 'Nothing to join here' }).waitFor()
    await late.page.context().close()
  })

  it('the assistant adds an opponent and a game that was watched', async () => {
    const { page } = bo
    await link(page, 'Opponents')
    await page.getByRole('button', { name: /^Add/ }).first().click()
    await page.getByLabel('Name', { exact: true }).fill('Tarn Valley')
    await page.keyboard.press('Enter')
    await page.getByLabel('Day', { exact: true }).click()
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('Enter')
    await page.getByLabel(/^Tip-off/).fill('23:45')
    await page.keyboard.press('Enter')
    await page.getByRole('group', { name: 'Where' }).getByRole('button').first().click()
    await page.getByRole('button', { name: 'Add them' }).click()
    await link(page, 'Set up a game to watch')
    await page.getByRole('button', { name: 'Say which game it was' }).click()
    await page.getByLabel('Whom they played').fill('Dunholt Badgers')
    await page.keyboard.press('Enter')
    await page.getByRole('button', { name: 'Yesterday', exact: true }).click()
    await page.getByRole('button', { name: 'On film', exact: true }).click()
    expect(await seriousFaults(page)).toEqual([])
    await page.getByRole('button', { name: 'Add it and log' }).click()
    await page.waitForURL(/\/log/)
  })

  it('and logs what they did by keyboard, with a still', async () => {
    const { page } = bo
    const [, still] = await Promise.all([
      page.getByRole('button', { name: /Made basket/ }).waitFor(),
      jpeg(1600, 900),
    ])
    for (let number = 1; number <= 3; number += 1) {
      await page.getByRole('button', { name: /Made basket/ }).waitFor()
      for (const [key, asked] of [
        ['1', /1-2-1-1/],
        ['2', /Full court/],
        ['1', /No trap/],
        ['8', /Through, with numbers/],
        ['2', /The thrower/],
      ] as const) {
        await page.keyboard.press(key)
        await page.getByRole('button', { name: asked }).first().waitFor()
      }
      if (number === 1)
        await page
          .getByLabel('Pictures for this possession')
          .setInputFiles({ name: 'still.jpg', mimeType: 'image/jpeg', buffer: still })
      const sent = page.waitForResponse(
        (answer) => answer.url().includes('/possessions/') && answer.request().method() === 'PUT',
      )
      await page.keyboard.press('Enter')
      expect((await sent).ok()).toBe(true)
      await page.getByText(new RegExp(`No\\. ${number} saved`)).waitFor()
    }
    expect(await seriousFaults(page)).toEqual([])
  })

  it('the head coach puts players on the list, reads, and finds the answer to any press first', async () => {
    const { page } = ada
    await link(page, 'Squad')
    await page.getByRole('button', { name: 'Add a player' }).first().click()
    const form = page.getByRole('region', { name: 'Add a player' })
    await form.getByLabel('Shirt number').first().fill('7')
    await form.getByLabel('First name').fill('Wren')
    await form.getByLabel('Last name').fill('Castellan')
    expect(await seriousFaults(page)).toEqual([])
    await form.getByRole('button', { name: 'Add to the squad' }).click()
    await page.getByText('Wren').first().waitFor()
    const [, team = ''] = /\/t\/([^/]+)/.exec(page.url()) ?? []
    const skills = { handle: 3, 'throw-in': 3, 'long-arm': 3, decide: 3, sprint: 3, screen: 3 }
    for (const jersey of [11, 12, 13, 14, 15]) {
      const answer = await page.request.put(`/api/teams/${team}/squad/${randomUUID()}`, {
        headers: { Origin: product.url },
        data: { jersey, firstName: `P${jersey}`, skills },
      })
      expect(answer.status()).toBe(201)
    }
    await link(page, 'Opponents')
    await link(page, /^Tarn Valley/)
    await page.getByRole('heading', { level: 1, name: 'Tarn Valley' }).waitFor()
    await page
      .getByText(/3\s*of\s*3/)
      .first()
      .waitFor()
    expect(await seriousFaults(page)).toEqual([])
    await link(page, /Choose/)
    await page.getByText('We do not know yet').first().waitFor()
    await page.getByText(/counter for any press stands first/).waitFor()
    expect(await seriousFaults(page)).toEqual([])
  })

  it('picks it and signs off', async () => {
    const { page } = ada
    const saved = page.waitForResponse(
      (answer) => answer.url().endsWith('/plan') && answer.request().method() === 'PUT',
    )
    await page.getByText('First call', { exact: true }).first().click()
    expect((await saved).ok()).toBe(true)
    await page.getByRole('button', { name: /Sign off and make the sheet/ }).click()
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /Sign off/ })
      .click()
    await page.waitForURL(/\/sheets\//)
    await page
      .getByText(/of 120/)
      .first()
      .waitFor()
    sheetPath = new URL(page.url()).pathname
  })

  it('and a player of the squad, asked in by a link, opens it on a phone', async () => {
    await ada.page.goto(sheetPath.replace(/\/sheets\/.*/, '/week'))
    const address = await invite(ada.page, /^Player/i, /Wren/)
    const { page } = wren
    await join(page, address, 'Wren Castellan', 'wren@club.example')
    await link(page, 'Open your sheet')
    await page.getByRole('heading', { level: 1, name: 'Tarn Valley' }).waitFor()
    expect(new URL(page.url()).pathname).toBe(sheetPath)
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('nothing went wrong in any of the three browsers', () => {
    expect([ada.faults, bo.faults, wren.faults]).toEqual([[], [], []])
  })
})
