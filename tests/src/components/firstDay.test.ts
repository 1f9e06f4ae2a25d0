import { describe, expect, it } from 'vitest'
import type { SceneNode } from '@shared/court/scene'
import { firstDayScene } from '@/components/firstDayScene'
import { firstDaySteps } from '@/components/firstDaySteps'

const nothing = { players: 0, games: 0, opponents: 0, possessions: 0 }
const done = (counts: Partial<typeof nothing>) =>
  firstDaySteps({ ...nothing, ...counts }).map((step) => step.done)

describe('a club’s first day', () => {
  it('has a team from the start; five in the squad, a meeting and ten counted make the rest', () => {
    expect(done({})).toEqual([true, false, false, false])
    expect(done({ players: 4 })).toEqual([true, false, false, false])
    expect(done({ players: 5, opponents: 1, games: 1, possessions: 9 })).toEqual([true, true, true, false])
    expect(done({ players: 5, opponents: 1, games: 1, possessions: 10 })).toEqual([true, true, true, true])
  })

  it('says how far the count has come', () => {
    expect(firstDaySteps({ ...nothing, possessions: 4 })[3]?.detail).toMatch(/^4 of ten so far/)
  })

  it('has the ball at the one to do, and none once all is done', () => {
    const names = ['', 'Squad', 'Who is next', 'Ten throw-ins']
    const idsOf = (nodes: SceneNode[]) => nodes.flatMap((node) => (node.kind === 'group' ? [node.id] : []))
    const first = firstDayScene('fiba', [true, false, false, false], names)
    expect(idsOf(first.nodes)).toEqual(expect.arrayContaining(['station-1', 'station-2', 'ball']))
    expect(first.description).toContain('Squad, now; Who is next, ahead')
    expect(idsOf(firstDayScene('fiba', [true, true, true, true], names).nodes)).not.toContain('ball')
  })
})
