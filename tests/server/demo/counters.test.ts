import { describe, it, expect } from 'vitest'
import { CounterBody } from '@shared/counters/schemas'
import type { Diagram } from '@shared/court/diagram'
import { diagramFaults } from '@shared/court/diagramFaults'
import { startOfDiagram, walkDiagram, walkStep } from '@shared/court/diagramWalk'
import { rulePack } from '@shared/court/rulePacks'
import { budgetOf } from '@shared/sheets/budget'
import { FAMILIES, TRAITS } from '@shared/counterWords'
import { valuesOf } from '@shared/vocabulary'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { FIVE, frozenCounter, frozenPlan, sheetView } from '../../support/sheetFixture'
import { metres, walk } from './walk'

const words = (text: string) => text.split(/\s+/).filter(Boolean).length

/** Passes short of half by a player whom two stand within reach of, with where all ten stand at that moment. */
const passesOutOfTraps = (diagram: Diagram) =>
  walkDiagram(diagram).flatMap(({ before, moves }, step) =>
    moves.flatMap(({ move, from: place }) => {
      if (move.kind !== 'pass' || move.throwIn || place.x >= 0.5) return []
      const sooner = diagram.steps[step]?.moves.filter(
        (other) => other.beat < move.beat || (other.beat === move.beat && other.kind !== 'pass'),
      )
      const standing = walkStep(before, sooner ?? []).after
      const near = [...standing.theirs.values()].filter((at) => metres(at, place) < 2.2)
      return near.length < 2 ? [] : [{ from: move.from, place, standing }]
    }),
  )

describe('the invented library', () => {
  it('holds sixteen counters over all ten families, none to be taken for another', () => {
    expect(DEMO_COUNTERS).toHaveLength(16)
    expect(new Set(DEMO_COUNTERS.map(({ family }) => family))).toEqual(new Set(valuesOf(FAMILIES)))
    for (const field of ['key', 'name', 'signal'] as const)
      expect(new Set(DEMO_COUNTERS.map((counter) => counter[field])).size).toBe(16)
    // A call is one word, shouted: no two begin with the same sound.
    for (const { call } of DEMO_COUNTERS) expect(call).toMatch(/^[A-Z][a-z]+$/)
    expect(new Set(DEMO_COUNTERS.map(({ call }) => call.slice(0, 2))).size).toBe(16)
  })

  it('offers every trait that a rule may ask for', () => {
    const offered = new Set(DEMO_COUNTERS.flatMap(({ traits }) => traits))
    expect(valuesOf(TRAITS).filter((trait) => !offered.has(trait))).toEqual([])
  })

  it('has one universal counter, one that starts in a corner and three that are not game-ready', () => {
    const having = (trait: string) =>
      DEMO_COUNTERS.filter((counter) => counter.traits.some((own) => own === trait)).map(({ key }) => key)
    expect(having('universal')).toEqual(['two-up'])
    expect(having('corner-entry')).toEqual(['middle-three'])
    expect(having('deep-first-look')).toEqual(['stack'])
    expect(DEMO_COUNTERS.filter((counter) => counter.liveReps < 10).map(({ key }) => key)).toEqual([
      'clear',
      'echo',
      'island',
    ])
  })
})

describe.each(DEMO_COUNTERS)('$name', (body) => {
  const walked = walk(body.diagram)

  it('parses without a change', () => {
    expect({ key: body.key, ...CounterBody.parse(body) }).toEqual(body)
  })

  it('could be played: nobody teleports, crowds, walks with the ball or throws through a defender', () => {
    expect(walked.faults).toEqual([])
  })

  it('is drawn in three to six steps, in which their five move too', () => {
    expect(body.diagram.steps.length).toBeGreaterThanOrEqual(3)
    expect(body.diagram.steps.length).toBeLessThanOrEqual(6)
    for (const { moves } of body.diagram.steps) expect(moves.some(({ kind }) => kind === 'theirs')).toBe(true)
  })

  it.each(body.rulePacks)(
    'has nothing that the drawing board would call a fault on a court of %s',
    (pack) => {
      expect(diagramFaults(body.diagram, rulePack(pack))).toEqual([])
    },
  )

  it('says what the book allows: a run along the line after a basket only, a blind screen one step off', () => {
    const cautions = body.cautions.join(' ')
    if (walked.lineRun > 0) expect(body.traits).toContain('end-line-run')
    if (body.traits.includes('end-line-run')) expect(cautions).toMatch(/after a (basket|whistle)/i)
    const blind = body.diagram.steps.some(({ moves }) => moves.some((m) => m.kind === 'screen' && m.blind))
    expect(/blind.*one step/.test(cautions)).toBe(blind)
  })

  it('keeps every player’s sheet within its words, as first call and as change-up', () => {
    const players = FIVE.map(({ squadPlayerId }) => squadPlayerId)
    const own = frozenCounter(body.key, players)
    for (const plan of [{ firstCall: own }, { changeUp: own }]) {
      const { words: used, over } = budgetOf(sheetView(frozenPlan(plan)))
      expect([over, used], JSON.stringify(Object.keys(plan))).toEqual([false, used])
    }
  })

  it('is in within five seconds and over half well within eight', () => {
    expect(walked.throwInAt).toBeLessThan(4)
    expect(walked.overHalfAt).not.toBeNull()
    expect(walked.overHalfAt).toBeLessThan(6.5)
  })

  it('claims only traits that its drawing shows', () => {
    const traits = new Set<string>(body.traits)
    expect(traits.has('corner-entry')).toBe(walked.firstCatchInCoffin)
    const kinds = body.diagram.steps.flatMap((step) => step.moves)
    expect(kinds.some((move) => move.kind === 'screen')).toBe(traits.has('ball-side-screens'))
    if (traits.has('valve-behind'))
      expect(
        walked.catches.filter((c) => c.at.x < 0.5 && c.who !== walked.thrower).every((c) => c.behind),
      ).toBe(true)
    if (traits.has('deep-first-look')) expect(walked.firstCatch?.x).toBeGreaterThan(0.5)
    if (traits.has('return-to-thrower'))
      expect(kinds.some((move) => move.kind === 'pass' && move.to === walked.thrower)).toBe(true)
    const catches = walked.catches
    if (traits.has('catch-off-lines')) expect(catches[0]?.at.x).toBeGreaterThan(0.0715)
    if (traits.has('quick-entry')) expect(walked.throwInAt).toBeLessThan(1)
    if (traits.has('two-guard-front'))
      for (const side of [(y: number) => y < 0.45, (y: number) => y > 0.55])
        expect(
          [...startOfDiagram(body.diagram).ours.values(), ...catches.map(({ at }) => at)].some(
            ({ x, y }) => x > 0 && x < 0.25 && side(y),
          ),
        ).toBe(true)
    const passes = walkDiagram(body.diagram)
      .flatMap(({ moves }) => moves)
      .filter(({ move }) => move.kind === 'pass')
    if (traits.has('far-diagonal'))
      expect(passes.some(({ from, to }) => to.x > from.x + 0.05 && Math.abs(to.y - from.y) > 0.2)).toBe(true)
    if (traits.has('far-side-reversal'))
      expect(
        passes.some(({ from, to }, i) => {
          const across = passes[i + 1]
          return across && to.x < from.x && (from.y - 0.5) * (across.to.y - 0.5) < 0
        }),
      ).toBe(true)
    if (traits.has('sideline-entry')) expect(body.looks.some((look) => look.includes('line'))).toBe(true)
    if (traits.has('middle-entry'))
      expect(
        kinds.some(
          (move) =>
            (move.kind === 'cut' || move.kind === 'screen') &&
            move.to.x < 0.5 &&
            move.to.x > 0.16 &&
            Math.abs(move.to.y - 0.5) < 0.17,
        ),
      ).toBe(true)
  })

  it('keeps outlets at the catch that is trapped: behind or middle, and somebody deep', () => {
    for (const at of walked.catches.filter((c) => c.at.x < 0.3 && body.family !== 'clear-out')) {
      expect(at.behind || at.middle).toBe(true)
    }
    if (body.family !== 'stack') expect(walked.catches.some((c) => c.deep)).toBe(true)
  })

  it('has three ways out of every trap in the backcourt, one of them behind, and somebody far', () => {
    for (const { from, place, standing } of passesOutOfTraps(body.diagram)) {
      const mates = [...standing.ours].filter(([role]) => role !== from).map(([, at]) => at)
      const behind = mates.filter(({ x }) => x < place.x - 0.03)
      const middle = mates.filter((at) => Math.abs(at.y - 0.5) < 0.2 && metres(at, place) < 11)
      // From the middle both lines are ways out; from a side the one that the ball is on.
      const central = Math.abs(place.y - 0.5) < 0.2
      const line = mates.filter(
        ({ x, y }) => x > place.x && Math.abs(y - 0.5) > 0.2 && (central || (y - 0.5) * (place.y - 0.5) > 0),
      )
      expect(behind.length).toBeGreaterThan(0)
      expect(new Set([...behind, ...middle, ...line]).size).toBeGreaterThanOrEqual(3)
      expect(mates.some(({ x }) => x >= 0.44)).toBe(true)
    }
  })

  it('gives each of the five roles a job, a key step that exists, and few words', () => {
    expect(new Set(body.roles.map(({ role }) => role)).size).toBe(5)
    for (const role of body.roles) {
      expect(role.keyStep).toBeLessThan(body.diagram.steps.length)
      expect(role.jobs.length).toBeGreaterThan(0)
      for (const job of role.jobs) expect(words(job)).toBeLessThanOrEqual(8)
      expect(role.jobs.reduce((sum, job) => sum + words(job), 0)).toBeLessThanOrEqual(24)
      expect(words(role.changeUpLine)).toBeLessThanOrEqual(9)
      expect(role.needs.length).toBeGreaterThan(0)
    }
    for (const dont of body.donts) expect(words(dont)).toBeLessThanOrEqual(7)
  })

  it('has a practice count that its live reps can hold', () => {
    expect(body.practice.k).toBeLessThanOrEqual(body.practice.n)
    expect(body.practice.n).toBeLessThanOrEqual(body.liveReps)
  })
})
