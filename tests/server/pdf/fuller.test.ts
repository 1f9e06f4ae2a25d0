import { describe, it, expect } from 'vitest'
import { FULLER_BUDGET, fullerBudgetOf, fullerContent, fullerWords } from '@shared/sheets/fuller'
import { readBy } from '@shared/sheets/reader'
import { copiesPdf, sheetPdf } from '@server/adapters/pdf/sheetPdf'
import { SheetTooFull } from '@server/adapters/pdf/sheetTooFull'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { FIVE, frozenCounter, frozenPlan, sheetView } from '../../support/sheetFixture'
import { readPdf } from './readPdf'

const nell = FIVE[0].squadPlayerId
const ids = FIVE.map(({ squadPlayerId }) => squadPlayerId)
const looksOf = (key: string) => DEMO_COUNTERS.find((one) => one.key === key)?.looks ?? []
const counterOf = (key: string) => ({ ...frozenCounter(key, ids), looks: looksOf(key) })
const fuller = (key = 'one-four') => sheetView(frozenPlan({ firstCall: counterOf(key) }), { fuller: true })

describe.each(['a4', 'letter'] as const)('the fuller page on %s', (paper) => {
  it('is one page with what they do, our steps, who, looks, change-up and keys, and no last name', async () => {
    const { text, info } = readPdf(await sheetPdf(readBy(fuller(), nell), { paper, copy: 3, copies: 12 }))
    expect(info.get('Pages')).toBe('1')
    for (const said of [
      'Port Selby Gulls',
      'What they do',
      '7 of 11',
      'What we do: 1-4 across',
      'Wings sprint, the middle empties',
      'Three on one',
      'Nell no. 4',
      'Look, in this order',
      'On “Box”',
      'Don’t catch in the corner.',
      'Sheet 3 of 12, plan 2. Nell, 4.',
      'Bring it back.',
    ])
      expect(text).toContain(said)
    for (const { lastName } of FIVE) expect(text).not.toContain(lastName)
    for (const { signal } of DEMO_COUNTERS) expect(text).not.toContain(signal)
  })

  it.each(DEMO_COUNTERS.map(({ key }) => key))('holds %s on one page within its words', async (key) => {
    const view = fuller(key)
    const page = fullerContent(readBy(view, nell), { copy: 3, copies: 12 })
    expect(fullerWords(page)).toBeLessThanOrEqual(FULLER_BUDGET.words)
    const pdf = await sheetPdf(readBy(view, nell), { paper })
    expect(pdf.toString('latin1').match(/\/Type \/Page\b(?!s)/g)).toHaveLength(1)
  })

  it('is refused rather than set under 9.5 pt', async () => {
    const view = fuller()
    const keys = Array<string>(20).fill('Look again and pass before they come to you. '.repeat(6).trim())
    const far = { ...view, content: { ...view.content, keys } }
    expect(fullerBudgetOf(far).over).toBe(true)
    await expect(sheetPdf(far, { paper })).rejects.toBeInstanceOf(SheetTooFull)
  })
})

describe('copies in one file', () => {
  it('carry each its number and its reader, one page each, tagged in one tree', async () => {
    const pages = [nell, ids[1] ?? null, null].map((reader, at) => ({
      view: readBy(sheetView(), reader),
      copy: at + 1,
    }))
    const { text, info, structure } = readPdf(await copiesPdf(pages, 'a4', 12))
    expect(info.get('Pages')).toBe('3')
    expect(info.get('Tagged')).toBe('yes')
    expect(text).toContain('Sheet 1 of 12, plan 2. Nell, 4.')
    expect(text).toContain('Sheet 2 of 12, plan 2. Ada, 11.')
    expect(text).toContain('Sheet 3 of 12, plan 2.')
    expect(structure.match(/^\s*H1\b/gm)).toHaveLength(3)
  })
})
