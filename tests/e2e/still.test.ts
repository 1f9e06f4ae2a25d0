import { createHash } from 'node:crypto'
import type { Browser, Locator, Page } from 'playwright-core'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, seriousFaults, signIn } from '../support/browser'
import { startProduct, type Product } from '../support/product'
import { staffAddresses, type StaffPage } from '../support/staffPages'

/** A still from the log to the report: marked by keyboard, blurred for good, ordered, chosen, shown again on the read. */
let product: Product
let browser: Browser
let page: Page
let faults: string[]
let addressOf: (name: StaffPage) => string
let board: Locator

interface Still {
  id: string
  position: number
  caption: string
  marks: { ring: unknown; shade: unknown; pass: unknown }
  facesLeft: number | null
  inReport: boolean
  url: string
}
interface Possession {
  id: string
  number: number
  stills: Still[]
}
let row: Possession
/** How long a write may take on a busy machine. */
const WAIT = { timeout: 20_000 }

/** Every pixel another one, so that what a blur took away can be seen. */
const noise = (seed: number): Promise<Buffer> => {
  const bytes = Buffer.alloc(960 * 540 * 3)
  for (let at = 0; at < bytes.length; at += 1) bytes[at] = ((at * 7919 + seed * 104729) ^ (at >> 3)) & 255
  return sharp(bytes, { raw: { width: 960, height: 540, channels: 3 } })
    .jpeg({ quality: 90 })
    .toBuffer()
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

const api = (path: string) => path.replace('/t/', '/api/teams/')
async function logged(): Promise<Possession> {
  const answer = await page.request.get(api(addressOf('log')).replace('/log', '/possessions'))
  const { rows } = (await answer.json()) as { rows: Possession[] }
  return rows.reduce((last, one) => (one.number > last.number ? one : last))
}
const first = async () => (await logged()).stills.find(({ position }) => position === 1) as Still
/** How rough the smoothest square of the served picture is: the spread of its brightness. */
async function smoothest(still: Still): Promise<number> {
  const answer = await page.request.get(api(addressOf('week')).replace('/week', `/stills/${still.id}`))
  const { data, info } = await sharp(await answer.body())
    .greyscale()
    .raw()
    .toBuffer({ resolveWithObject: true })
  let least = Infinity
  for (let top = 0; top + SQUARE <= info.height; top += SQUARE / 2)
    for (let left = 0; left + SQUARE <= info.width; left += SQUARE / 2) {
      let [sum, squares] = [0, 0]
      for (let y = top; y < top + SQUARE; y += 1)
        for (let x = left; x < left + SQUARE; x += 1) {
          const value = data[y * info.width + x] ?? 0
          sum += value
          squares += value * value
        }
      const mean = sum / SQUARE ** 2
      least = Math.min(least, Math.sqrt(squares / SQUARE ** 2 - mean * mean))
    }
  return least
}
/** Px: well inside what a blur of one face takes. */
const SQUARE = 16

describe('a still', () => {
  it('is put on a possession in the log, two of them at once', async () => {
    await page.goto(addressOf('log'))
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
    const files = await Promise.all(
      [1, 2].map(async (seed) => ({
        name: `${seed}.jpg`,
        mimeType: 'image/jpeg',
        buffer: await noise(seed),
      })),
    )
    await page.getByLabel('Pictures for this possession').setInputFiles(files)
    await page.keyboard.press('Enter')
    await page.getByText(/No\. \d+ saved/).waitFor()
    await expect.poll(async () => (await logged()).stills.length, WAIT).toBe(2)
    row = await logged()
  })

  it('gets its marks and words on the board by keyboard alone', async () => {
    await page.goto(`${addressOf('possessions')}?row=${row.id}`)
    board = page.getByRole('region', { name: 'Stills', exact: true })
    const stage = board.getByRole('application')
    await stage.waitFor()
    await stage.focus()
    for (const key of [
      'r',
      'Enter',
      'ArrowLeft',
      'ArrowLeft',
      '+',
      'h',
      'Enter',
      'ArrowRight',
      'p',
      'Enter',
      'ArrowUp',
    ])
      await page.keyboard.press(key)
    await page.keyboard.press('w')
    await board.getByLabel('Words on the still').fill('Middle is open behind the trap')
    await page.keyboard.press('Enter')
    await expect.poll(async () => (await first()).caption, WAIT).toBe('Middle is open behind the trap')
    const drawn = async () => {
      const { marks } = await first()
      return [marks.ring, marks.shade, marks.pass].map((mark) => mark !== null)
    }
    await expect.poll(drawn, WAIT).toEqual([true, true, true])
    expect(await seriousFaults(page)).toEqual([])
  })

  it('has a face burned away after a question, in what is served too', async () => {
    const still = await first()
    const before = await page.request.get(api(addressOf('week')).replace('/week', `/stills/${still.id}`))
    const rough = await smoothest(still)
    expect(rough).toBeGreaterThan(25)
    await board.getByRole('application').focus()
    await page.keyboard.press('b')
    await page.keyboard.press('Enter')
    const box = await board.getByRole('application').boundingBox()
    if (!box) throw new Error('no picture to tap')
    await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2)
    await board.getByRole('button', { name: /^Blur (this face|these \d)/ }).click()
    const question = page.getByRole('dialog')
    expect(await seriousFaults(page)).toEqual([])
    await question.getByRole('button', { name: 'Blur for good' }).click()
    await question.waitFor({ state: 'hidden' })
    await expect.poll(() => smoothest(still), WAIT).toBeLessThan(rough / 2)
    const after = await page.request.get(api(addressOf('week')).replace('/week', `/stills/${still.id}`))
    const digest = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex')
    expect(digest(await after.body())).not.toBe(digest(await before.body()))
  })

  it('is chosen for the report once no face is left, and put second', async () => {
    const { id } = await first()
    const none = board.getByRole('button', { name: 'None', exact: true })
    if ((await none.count()) > 0) await none.click()
    const report = board.getByRole('checkbox', { name: /staff’s report/ })
    await expect.poll(() => report.isEnabled(), WAIT).toBe(true)
    await board.getByText('In the staff’s report').click()
    const chosen = async () => (await logged()).stills.find((still) => still.id === id)
    await expect.poll(async () => (await chosen())?.inReport, WAIT).toBe(true)
    await board.getByText(/^Order of the 2 stills/).click()
    await board
      .getByRole('button', { name: /^Later/ })
      .first()
      .click()
    await expect.poll(async () => (await chosen())?.position, WAIT).toBe(2)
  })

  it('is shown with its marks where the read opens the possession', async () => {
    await page.goto(`${addressOf('read, a habit open')}&possession=${row.id}`)
    const thumb = page.getByRole('button', { name: /Open large/ })
    await thumb.last().click()
    const large = page.getByRole('dialog', { name: /./ }).last()
    await large.getByText('Middle is open behind the trap').first().waitFor()
    for (const mark of ['ellipse.ring', 'rect.shade', 'g.pass'])
      expect(await large.locator(mark).count()).toBeGreaterThan(0)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('nothing went wrong behind it', () => {
    expect(faults).toEqual([])
  })
})
