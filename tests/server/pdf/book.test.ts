import { describe, it, expect } from 'vitest'
import { CounterBody } from '@shared/counters/schemas'
import { rulePack } from '@shared/court/rulePacks'
import { bookPdf } from '@server/adapters/pdf/bookPdf'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { FIVE } from '../../support/sheetFixture'
import { readPdf } from './readPdf'

const pack = rulePack('fiba')
const counters = DEMO_COUNTERS.map((counter) => CounterBody.parse(counter))
const pages = counters.map((counter) => ({ counter, pack }))
const owner = 'Harrow Creek Herons, U17 girls'
const first = counters[0] as CounterBody

/** As long as every field may be, on the longest drawing. */
const longest = (): CounterBody => {
  const words = (length: number) => 'Wait, then look across once more, '.repeat(9).slice(0, length - 1) + '.'
  const step = first.diagram.steps.find(({ moves }) => moves.length > 3) ?? first.diagram.steps[0]
  return {
    ...first,
    name: words(40),
    alignment: words(60),
    diagram: {
      ...first.diagram,
      steps: Array.from({ length: 12 }, () => ({ title: words(60), moves: step?.moves ?? [] })),
    },
    roles: first.roles.map((role) => ({ ...role, title: words(40), jobs: Array(4).fill(words(80)) })),
    looks: Array(4).fill(words(60)),
    teachingPoints: Array(6).fill(words(90)),
    cautions: Array(4).fill(words(120)),
    donts: Array(3).fill(words(60)),
  }
}

describe.each(['a4', 'letter'] as const)('the book on %s', (paper) => {
  it('is a page a counter, tagged, with steps, roles, looks, what to tell them and counts', async () => {
    const { text, info, fonts, structure } = readPdf(await bookPdf(pages, paper, owner))
    expect(info.get('Pages')).toBe(String(counters.length))
    expect(info.get('Tagged')).toBe('yes')
    expect(info.get('Page size')).toMatch(paper === 'a4' ? /595.*841/ : /612 x 792/)
    expect(fonts.every(({ embedded }) => embedded)).toBe(true)
    expect(structure.match(/^\s*H1\b/gm)).toHaveLength(counters.length)
    // In the order of the tags a title stays whole, whatever stands beside it on the page.
    const said = structure.replace(/["\\]/g, '').replace(/\s+/g, ' ')
    for (const counter of counters) {
      for (const { title } of counter.diagram.steps) expect(said).toContain(title)
      for (const look of counter.looks) expect(said).toContain(look)
      for (const point of counter.teachingPoints) expect(said).toContain(point)
      for (const caution of counter.cautions) expect(said).toContain(caution)
      for (const { jobs } of counter.roles) for (const job of jobs) expect(said).toContain(job)
    }
    expect(text).toMatch(/Thrown in at \d\.\d of 5 s\./)
    expect(text).toContain(`${owner} `)
    expect(text).toContain(`2 of ${counters.length}`)
  })

  it('names no player and no sign of the hand', async () => {
    const { text } = readPdf(await bookPdf(pages, paper, owner))
    for (const { lastName } of FIVE) expect(text).not.toContain(lastName)
    for (const { signal } of counters) if (signal !== '') expect(text).not.toContain(signal)
  })

  it('holds even the longest counter on one page', async () => {
    const { text, info } = readPdf(await bookPdf([{ counter: longest(), pack }], paper, owner))
    expect(info.get('Pages')).toBe('1')
    // The last words of the page, over its foot, were not cut away.
    expect(text).toContain(owner)
  })
})

describe('one counter', () => {
  it('carries its own name as the title, and its drawings in words', async () => {
    const { info, structure, text } = readPdf(await bookPdf(pages.slice(0, 1), 'a4', owner))
    expect(info.get('Title')).toBe(first.name)
    expect(structure.match(/^\s*Figure\b/gm)).toHaveLength(first.diagram.steps.length)
    expect(text).not.toContain('1 of 1')
  })
})
