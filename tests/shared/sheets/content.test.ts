import { describe, it, expect } from 'vitest'
import { sheetContent } from '@shared/sheets/content'
import { pressDrawing, textsOf, wayCrop, wayDrawing } from '@shared/sheets/drawings'
import { keyStepOf, readBy, wayShown } from '@shared/sheets/reader'
import { sheetWhen } from '@shared/sheets/when'
import { FIVE, frozenCounter, frozenPlan, sheetView } from '../../support/sheetFixture'

const [nell, ada, imara, wren] = FIVE.map(({ squadPlayerId }) => squadPlayerId)
const bench = '00000000-0000-4000-8000-000000000099'

describe('what stands on a sheet', () => {
  it('speaks to a player by first name and her role, with her own jobs', () => {
    const page = sheetContent(readBy(sheetView(), nell ?? null), { copy: 3, copies: 10 })
    expect(page.reader).toMatchObject({ kind: 'one', name: 'Nell', role: '1', rest: 'you are 1.' })
    expect(page.reader.kind === 'one' && page.reader.jobs[0]).toBe('Come to the ball off 2’s screen.')
    expect(page.way).toMatchObject({ counter: 'firstCall', step: 2, you: '1' })
    expect(page.way.heading).toBe('First call “Four”: 1-4 across')
    expect(page.other).toEqual({ lead: 'On “Box”:', line: 'catch wide, turn, hit 5 in the middle.' })
    expect(page.foot).toEqual({
      sheet: 'Sheet 3 of 10, plan 2.',
      owner: { name: 'Nell', jersey: 4 },
      back: 'Bring it back.',
    })
  })

  it('says which role a player changes to in the change-up', () => {
    const page = sheetContent(readBy(sheetView(), ada ?? null))
    // Ada is 2 in the first call and 5 in the change-up.
    expect(page.other?.lead).toBe('On “Box” you are 5:')
    expect(page.other?.line).toBe('flash middle, turn, look far side.')
  })

  it('tells a player without a place in the change-up that she comes off', () => {
    const changeUp = frozenCounter('box', [bench, ada ?? null, imara ?? null, wren ?? null, null])
    const page = sheetContent(readBy(sheetView(frozenPlan({ changeUp })), nell ?? null))
    expect(page.other).toEqual({ lead: 'On “Box”:', line: 'you come off.' })
  })

  it('draws the change-up for somebody who plays in it alone', () => {
    const changeUp = frozenCounter('box', [null, null, null, null, bench])
    const view = sheetView(frozenPlan({ changeUp }), {
      players: [{ squadPlayerId: bench, firstName: 'Hanne', jersey: 18 }],
    })
    const page = sheetContent(readBy(view, bench))
    expect(page.way).toMatchObject({
      counter: 'changeUp',
      step: 2,
      you: '5',
      heading: 'Change-up: Box, big in the middle',
    })
    expect(page.reader).toMatchObject({ kind: 'one', rest: 'you are 5 on “Box”.' })
    expect(page.other?.lead).toBe('First call:')
  })

  it('is for everybody when the reader has no role, and opens with how the first call begins', () => {
    for (const reader of [null, bench]) {
      const page = sheetContent(readBy(sheetView(), reader))
      expect(page.way).toMatchObject({ step: 0, you: null })
      expect(page.reader.kind === 'five' && page.reader.rows.map(({ role, name }) => [role, name])).toEqual([
        ['1', 'Nell'],
        ['2', 'Ada'],
        ['3', 'Imara'],
        ['4', 'Wren'],
        ['5', 'Tess'],
      ])
    }
  })

  it('keeps a role whose player has been erased, without a name', () => {
    const page = sheetContent(sheetView(frozenPlan(), { players: [] }))
    expect(page.reader.kind === 'five' && page.reader.rows.map(({ name }) => name)).toEqual(
      Array(5).fill(null),
    )
  })

  it('says so when nothing was counted', () => {
    const press = { ...frozenPlan().press, lines: [], zones: [], room: null, pickup: null, mostlyShape: null }
    const page = sheetContent(sheetView(frozenPlan({ press })))
    expect(page.unknown).toBe('We do not know their press yet.')
    expect(page.lines).toEqual([])
  })

  it('sets apart what matters in a sentence and loses no word of it', () => {
    const page = sheetContent(sheetView())
    expect(page.lines.map(({ lead, strong }) => [lead, strong])).toEqual([
      ['They trap ', 'in the corner.'],
      ['They trap again ', 'just past half.'],
      ['They leave ', 'the middle open.'],
    ])
  })

  it('has no signal and no full name anywhere', () => {
    const text = JSON.stringify(sheetContent(readBy(sheetView(), nell ?? null)))
    for (const { lastName } of FIVE) expect(text).not.toContain(lastName)
    expect(text).not.toMatch(/finger|fist/)
  })
})

describe('when and where', () => {
  it('is said in the team’s own zone', () => {
    expect(sheetWhen('2026-03-20T19:15:00Z', 'Europe/London', 'home')).toBe('Friday 20 March, 19:15, at home')
    expect(sheetWhen('2026-07-20T23:30:00Z', 'Europe/Helsinki', 'away')).toBe('Tuesday 21 July, 02:30, away')
  })
})

describe('the drawings', () => {
  it('letters only what a line speaks of', () => {
    const content = frozenPlan()
    const texts = textsOf(pressDrawing(content, { width: 640, labels: 'letters' }).nodes)
    expect(texts.filter((text) => /^[A-C]$/.test(text)).sort()).toEqual(['A', 'A', 'B', 'B', 'C'])
    expect(texts).toContain('over half by 8 s')
  })

  it('prints no count that nobody counted', () => {
    const press = { ...frozenPlan().press, lines: [] }
    const texts = textsOf(pressDrawing(frozenPlan({ press }), { width: 640, labels: 'counts' }).nodes)
    expect(texts).toContain('5 of 11')
    expect(texts).not.toContain('0 of 0')
    expect(texts.join(' ')).not.toContain('left open')
  })

  it('makes the reader’s token the solid one', () => {
    const content = frozenPlan()
    const solid = (you: '2' | '3') => {
      const scene = wayDrawing(content, { counter: 'firstCall', step: 2, you }, { width: 400 })
      const tokens = scene.nodes.flatMap((node) =>
        node.kind === 'group' && node.id === 'tokens' ? node.nodes : [],
      )
      return tokens.flatMap((token) =>
        token.kind === 'group' && token.nodes.some((node) => node.kind === 'path' && node.fill === 'our')
          ? [token.label]
          : [],
      )
    }
    expect(solid('2')).toEqual(['2'])
    expect(solid('3')).toEqual(['3'])
  })

  it('reaches as far as the step goes', () => {
    const content = frozenPlan()
    expect(wayCrop(content, { counter: 'firstCall', step: 2, you: '1' })).toBe('half')
    expect(wayCrop(content, { counter: 'firstCall', step: 4, you: '3' })).toBe('full')
  })
})

describe('the step of a reader', () => {
  it('is never one that the diagram has not', () => {
    const counter = frozenCounter('one-four', [nell ?? null])
    const past = { ...counter, roles: counter.roles.map((role) => ({ ...role, keyStep: 11 })) }
    expect(keyStepOf(past, '1')).toBe(4)
    expect(keyStepOf(null, '1')).toBe(0)
  })

  it('comes from the first call before the change-up', () => {
    const mine = { squadPlayerId: bench, firstCallRole: '5' as const, changeUpRole: '4' as const }
    expect(wayShown(frozenPlan(), mine)).toEqual({ counter: 'firstCall', step: 1, you: '5' })
    expect(wayShown(frozenPlan(), { ...mine, firstCallRole: null })).toEqual({
      counter: 'changeUp',
      step: 0,
      you: '4',
    })
  })
})
