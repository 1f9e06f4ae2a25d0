import { describe, it, expect } from 'vitest'
import { CounterBody } from '@shared/counters/schemas'
import { diagramFaults } from '@shared/court/diagramFaults'
import { rulePack } from '@shared/court/rulePacks'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { walk } from './walk'

const words = (text: string) => text.split(/\s+/).filter(Boolean).length

describe('the invented library', () => {
  it('holds six counters of six families', () => {
    expect(DEMO_COUNTERS).toHaveLength(6)
    expect(new Set(DEMO_COUNTERS.map((counter) => counter.family)).size).toBe(6)
    expect(new Set(DEMO_COUNTERS.map((counter) => counter.key)).size).toBe(6)
    expect(new Set(DEMO_COUNTERS.map((counter) => counter.call)).size).toBe(6)
  })

  it('has one universal counter, one that starts in a corner and one that is not game-ready', () => {
    const having = (trait: string) =>
      DEMO_COUNTERS.filter((counter) => counter.traits.some((own) => own === trait)).map(({ key }) => key)
    expect(having('universal')).toEqual(['two-up'])
    expect(having('corner-entry')).toEqual(['middle-three'])
    expect(having('deep-first-look')).toEqual(['stack'])
    expect(DEMO_COUNTERS.filter((counter) => counter.liveReps < 10).map(({ key }) => key)).toEqual(['clear'])
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

  it('has nothing that the drawing board would call a fault', () => {
    expect(diagramFaults(body.diagram, rulePack('fiba'))).toEqual([])
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
