import { describe, it, expect } from 'vitest'
import { LIMITS } from '@shared/limits'
import { budgetOf } from '@shared/sheets/budget'
import { readBy } from '@shared/sheets/reader'
import { sheetPdf } from '@server/adapters/pdf/sheetPdf'
import { SheetTooFull } from '@server/adapters/pdf/sheetTooFull'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { FIVE, frozenCounter, frozenPlan, sheetView } from '../../support/sheetFixture'
import { readPdf } from './readPdf'

const nell = FIVE[0].squadPlayerId
const PAPERS = [
  { paper: 'a4', size: [595.28, 841.89] },
  { paper: 'letter', size: [612, 792] },
] as const

/** Pages as the file itself lists them; spares a look with another program where many are drawn. */
const pagesOf = (pdf: Buffer) => pdf.toString('latin1').match(/\/Type \/Page\b(?!s)/g)?.length

/** A sentence as long as a field lets it be. */
const longest = (length: number) =>
  'Catch and turn and look again '
    .repeat(10)
    .slice(0, length - 1)
    .trimEnd() + '.'

/** Everything as long as the library and the plan allow. */
function fullest() {
  const stretched = (key: string) => {
    const counter = frozenCounter(
      key,
      FIVE.map(({ squadPlayerId }) => squadPlayerId),
    )
    const roles = counter.roles.map((role) => ({
      ...role,
      jobs: Array<string>(4).fill(longest(80)),
      changeUpLine: longest(80),
    }))
    return { ...counter, name: longest(40), call: 'W'.repeat(20), roles }
  }
  const { press } = frozenPlan()
  return frozenPlan({
    opponentName: longest(LIMITS.name),
    place: 'neutral',
    press: {
      ...press,
      lines: press.lines.map((line) => ({ ...line, text: `They trap again ${longest(70)}`, k: 118, n: 240 })),
    },
    firstCall: stretched('one-four'),
    changeUp: stretched('box'),
    keys: Array<string>(LIMITS.keys).fill(longest(LIMITS.key)),
  })
}

describe.each(PAPERS)('the sheet on $paper', ({ paper, size }) => {
  it('is one tagged page with its fonts in it', async () => {
    const { info, fonts } = readPdf(await sheetPdf(readBy(sheetView(), nell), { paper, copy: 1, copies: 10 }))
    expect(info.get('Pages')).toBe('1')
    const [width, height] = (info.get('Page size') ?? '').split(/ x | pts/).map(Number)
    expect(width).toBeCloseTo(size[0], 1)
    expect(height).toBeCloseTo(size[1], 1)
    expect(info.get('Tagged')).toBe('yes')
    expect(info.get('Title')).toBe('Port Selby Gulls, Friday 20 March, 19:15, at home')
    expect(info.get('Author')).toBe('Overtop')
    expect(fonts.length).toBeGreaterThan(2)
    expect(fonts.filter(({ embedded }) => !embedded)).toEqual([])
    expect(fonts.every(({ name }) => name.includes('Archivo'))).toBe(true)
  })

  it('carries what a player needs and no last name', async () => {
    const { text } = readPdf(await sheetPdf(readBy(sheetView(), nell), { paper, copy: 7, copies: 10 }))
    for (const said of [
      'Port Selby Gulls',
      'Friday 20 March, 19:15, at home',
      '7 of 11',
      '4 of 9',
      '5 of 7',
      'First call “Four”: 1-4 across',
      'Nell, you are 1.',
      'Come to the ball off 2’s screen.',
      'On “Box”: catch wide, turn, hit 5 in the middle.',
      'Don’t catch in the corner.',
      'Don’t dribble into two.',
      'Sheet 7 of 10, plan 2. Nell, 4.',
      'Bring it back.',
      'over half by 8 s',
    ])
      expect(text).toContain(said)
    for (const { lastName } of FIVE) expect(text).not.toContain(lastName)
    for (const { signal } of DEMO_COUNTERS) expect(text).not.toContain(signal)
  })

  it('names the five on the general sheet', async () => {
    const { text, info } = readPdf(await sheetPdf(sheetView(), { paper }))
    expect(info.get('Pages')).toBe('1')
    for (const { firstName } of FIVE) expect(text).toContain(`${firstName}.`)
    expect(text).not.toContain('you are')
    expect(text).toContain('Sheet, plan 2.')
  })

  it.each(DEMO_COUNTERS.map(({ key }) => key))('is one page for every player of %s', async (key) => {
    const players = FIVE.map(({ squadPlayerId }) => squadPlayerId)
    const view = sheetView(frozenPlan({ firstCall: frozenCounter(key, players) }))
    for (const player of players) expect(pagesOf(await sheetPdf(readBy(view, player), { paper }))).toBe(1)
  })

  it('is still one page, in smaller type, when every field is as long as it may be', async () => {
    const view = sheetView(fullest())
    expect(budgetOf(view).over).toBe(true)
    for (const reader of [nell, null]) {
      const { info, text } = readPdf(await sheetPdf(readBy(view, reader), { paper, copy: 99, copies: 99 }))
      expect(info.get('Pages')).toBe('1')
      expect(text).toContain('118 of 240')
      expect(text).toContain('Bring it back.')
    }
  })

  it('is refused under the smallest type rather than run on to a second page', async () => {
    const content = fullest()
    const roles = content.firstCall.roles.map((role) => ({
      ...role,
      jobs: Array<string>(4).fill(longest(900)),
    }))
    const view = sheetView({ ...content, firstCall: { ...content.firstCall, roles } })
    const far = readBy(
      { ...view, content: { ...view.content, keys: Array<string>(9).fill(longest(280)) } },
      nell,
    )
    await expect(sheetPdf(far, { paper })).rejects.toBeInstanceOf(SheetTooFull)
  })
})

describe('for readers who cannot see it', () => {
  it('has headings, paragraphs, a list, and figures told in words', async () => {
    const pdf = await sheetPdf(readBy(sheetView(), nell), { paper: 'a4' })
    const { structure } = readPdf(pdf)
    const elements =
      structure.match(/^\s*(H1|H2|P|L|LI|Lbl|LBody|Figure)\b/gm)?.map((line) => line.trim()) ?? []
    const many = (type: string) => elements.filter((element) => element === type).length
    expect([many('H1'), many('H2'), many('Figure'), many('LI')]).toEqual([1, 2, 2, 3])
    expect(structure).toContain('They trap in the corner. 7 of 11')
    const raw = pdf.toString('latin1')
    expect(raw).toContain('/Marked true')
    expect(raw).toContain('/Lang (en)')
    expect(raw).toContain('/DisplayDocTitle true')
    expect(raw).toContain('/StructTreeRoot')
    expect(raw.match(/\/Alt \(/g)).toHaveLength(2)
    expect(raw).toContain('/Alt (Their press on the long court. A: They trap in the corner. 7 of 11.')
  })

  it('keeps the file’s own description well formed whatever the opponent is called', async () => {
    const view = sheetView(frozenPlan({ opponentName: 'Salt & Sons <U17>' }))
    const pdf = await sheetPdf(view, { paper: 'a4' })
    const { info, text } = readPdf(pdf)
    expect(text).toContain('Salt & Sons <U17>')
    expect(info.get('Title')).toMatch(/^Salt and Sons U17, /)
    const xml = /<rdf:RDF[\s\S]*<\/rdf:RDF>/.exec(pdf.toString('latin1'))?.[0] ?? ''
    expect(xml).toContain('Salt and Sons')
    expect(xml).not.toMatch(/&(?!amp;|lt;|gt;)/)
  })
})
