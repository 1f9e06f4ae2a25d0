import { describe, it, expect } from 'vitest'
import { CounterBody } from '@shared/counters/schemas'
import { gameMinute } from '@shared/court/gameTime'
import { rulePack } from '@shared/court/rulePacks'
import { spotAt } from '@shared/court/trapSpots'
import { GameBody } from '@shared/games/schemas'
import { OpponentBody } from '@shared/opponents/schemas'
import { PossessionBody } from '@shared/possessions/schemas'
import { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { Email } from '@shared/session/schemas'
import { SquadPlayerBody } from '@shared/squad/schemas'
import { LIMITS } from '@shared/limits'
import { GOT_OUT, NOT_PRESSED, SUCCESSES } from '@shared/vocabulary'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_PEOPLE, DEMO_SIGN_INS, DEMO_TIME_ZONE, demoTeams } from '@server/database/demo/people'
import { demoScenario } from '@server/database/demo/scenario'
import type { DemoPossession } from '@server/database/demo/scenario/types'
import { demoSquad } from '@server/database/demo/squad'

const NOW = new Date('2026-03-17T10:00:00Z')
const scenario = demoScenario(NOW, DEMO_TIME_ZONE)
const rows = scenario.possessions
const ID = 'a3bb189e-8bf9-4888-9912-ace4e6543002'

const of = (opponentKey: string) => {
  const games = new Set(
    scenario.scoutedGames.filter((g) => g.opponentKey === opponentKey).map(({ key }) => key),
  )
  return rows.filter((row) => row.scoutedGameKey !== null && games.has(row.scoutedGameKey))
}
const isPressed = ({ shape }: DemoPossession) =>
  typeof shape === 'string' && !NOT_PRESSED.some((other) => other === shape)
const spotsOf = (row: DemoPossession) =>
  Array.isArray(row.traps) ? row.traps.map((trap) => `${spotAt(trap).spot}:${spotAt(trap).side}`) : []
const gulls = of('gulls')
const pressed = gulls.filter(isPressed)
const count = (list: DemoPossession[], holds: (row: DemoPossession) => boolean) => list.filter(holds).length

describe('the scenario as rows', () => {
  it('is the same for the same day, and its games the same on every day', () => {
    expect(demoScenario(new Date(NOW), DEMO_TIME_ZONE)).toEqual(scenario)
    expect(demoScenario(new Date('2027-01-05T23:30:00Z'), DEMO_TIME_ZONE).possessions).toEqual(rows)
  })

  it('holds a season: 150 possessions over eight scouted games, and ours with counters called', () => {
    expect(scenario.opponents).toHaveLength(4)
    const ahead = scenario.games.filter((game) => Date.parse(game.tipOff) > NOW.getTime())
    expect(ahead.map(({ opponentKey }) => opponentKey)).toEqual(['gulls', 'otters', 'lowmoor', 'tarn'])
    expect(['gulls', 'lowmoor', 'otters', 'tarn'].map((key) => of(key).length)).toEqual([58, 52, 41, 5])
    expect(scenario.scoutedGames).toHaveLength(8)
    const called = new Set(rows.filter((row) => row.counterKey !== null).map((row) => row.gameKey))
    expect(called.size).toBeGreaterThanOrEqual(2)
    expect(scenario.scoutedGames.filter(({ opponentKey }) => opponentKey === 'gulls')).toHaveLength(3)
  })

  it('parses, row by row, once ids stand where keys were', () => {
    for (const game of scenario.games) expect(() => GameBody.parse({ ...game, opponentId: ID })).not.toThrow()
    for (const game of scenario.scoutedGames)
      expect(() => ScoutedGameBody.parse({ ...game, opponentId: ID })).not.toThrow()
    for (const opponent of scenario.opponents) expect(() => OpponentBody.parse(opponent)).not.toThrow()
    for (const { key, scoutedGameKey, gameKey, counterKey, tripKey, ...rest } of rows) {
      const idOf = (name: string | null) => (name === null ? null : ID)
      const parsed = PossessionBody.safeParse({
        ...rest,
        scoutedGameId: idOf(scoutedGameKey),
        gameId: idOf(gameKey),
        counterId: idOf(counterKey),
        tripId: idOf(tripKey),
      })
      expect(parsed.error?.issues ?? [], key).toEqual([])
    }
  })

  it('names only what is there, and every row once', () => {
    const keys = new Set(rows.map(({ key }) => key))
    expect(keys.size).toBe(rows.length)
    const opponents = new Set(scenario.opponents.map(({ key }) => key))
    const games = new Set(scenario.games.map(({ key }) => key))
    const scouted = new Set(scenario.scoutedGames.map(({ key }) => key))
    const counters = new Set(DEMO_COUNTERS.map(({ key }) => key))
    const people = new Set(DEMO_PEOPLE.map(({ key }) => key))
    for (const game of [...scenario.games, ...scenario.scoutedGames])
      expect(opponents.has(game.opponentKey)).toBe(true)
    for (const game of scenario.scoutedGames) expect(people.has(game.scoutKey)).toBe(true)
    for (const row of rows) {
      if (row.scoutedGameKey !== null) expect(scouted.has(row.scoutedGameKey)).toBe(true)
      if (row.gameKey !== null) expect(games.has(row.gameKey)).toBe(true)
      if (row.counterKey !== null) expect(counters.has(row.counterKey)).toBe(true)
    }
  })

  it('runs each game forward on a believable clock', () => {
    const fiba = rulePack('fiba')
    for (const game of new Set(rows.map((row) => row.scoutedGameKey ?? row.gameKey ?? ''))) {
      const list = rows.filter((row) => row.scoutedGameKey === game || row.gameKey === game)
      expect(
        list.map(({ number }) => number),
        game,
      ).toEqual(list.map((_, i) => i + 1))
      const minutes = list.map((row) => gameMinute(fiba, row.period ?? 0, row.clock ?? null))
      for (let i = 1; i < minutes.length; i += 1) expect(minutes[i], game).toBeGreaterThan(minutes[i - 1]!)
      for (const row of list) {
        const seconds = (row.clock ?? 0) / 10
        expect(seconds).toBeGreaterThanOrEqual(row.crossedAt ?? 0)
        expect(seconds).toBeLessThanOrEqual(600)
        for (const trap of Array.isArray(row.traps) ? row.traps : []) expect(trap.t ?? 0).toBeLessThan(8.5)
      }
      expect(new Set(list.map(({ margin }) => margin)).size).toBeGreaterThan(1)
    }
  })

  it('lets a made basket move the score by what it is worth', () => {
    const game = rows.filter((row) => row.scoutedGameKey === 'scout-gulls-3')
    game.slice(1).forEach((row, i) => {
      const before = game[i]!
      const moved = (row.margin ?? 0) - (before.margin ?? 0)
      if (row.trigger === 'made-basket') expect(moved).toBeGreaterThanOrEqual(-1)
      if (row.trigger === 'dead-ball') expect(moved).toBeLessThanOrEqual(0)
    })
    expect(rows.some(({ margin }) => (margin ?? 0) <= -6)).toBe(true)
    expect(gulls.some(({ margin }) => (margin ?? 0) <= -6)).toBe(true)
    expect(gulls.some(({ margin }) => (margin ?? 0) >= 6)).toBe(true)
  })

  it('logs outside the covered stretch only where it means to', () => {
    const fiba = rulePack('fiba')
    const outside = scenario.scoutedGames.flatMap(({ key, coverage = { kind: 'all' as const } }) =>
      rows
        .filter((row) => row.scoutedGameKey === key)
        .filter((row) => {
          if (coverage.kind === 'throw-ins') return row.trigger === 'live'
          if (coverage.kind === 'all') return false
          const minute = gameMinute(fiba, row.period ?? 0, row.clock ?? null)
          return minute < coverage.from || minute > coverage.to
        })
        .map((row) => row.key),
    )
    expect(outside).toEqual(['scout-lowmoor-1-31', 'scout-lowmoor-1-32'])
  })
})

describe('what the Gulls do', () => {
  const after = (trigger: string) => gulls.filter((row) => row.trigger === trigger)
  const trapped = pressed.filter((row) => spotsOf(row).length > 0)
  const logged = pressed.filter((row) => Array.isArray(row.traps))
  const has = (spot: string) => count(logged, (row) => spotsOf(row).includes(spot))

  it('press 35 of 58, most after free throws', () => {
    const share = (list: DemoPossession[]) => [count(list, isPressed), list.length]
    expect(share(gulls)).toEqual([35, 58])
    expect(share(after('made-basket'))).toEqual([16, 27])
    expect(share(after('made-free-throw'))).toEqual([10, 11])
    expect(share(after('dead-ball'))).toEqual([5, 14])
    expect(share(after('break'))).toEqual([4, 6])
  })

  it('press in a 1-2-1-1, pick up full, sometimes in a 2-2-1', () => {
    expect(count(pressed, ({ shape }) => shape === '1-2-1-1')).toBe(27)
    expect(count(pressed, ({ shape }) => shape === '2-2-1')).toBe(8)
    expect(count(pressed, ({ pickup }) => pickup === 'full')).toBe(26)
  })

  it('trap the corners on the catch, right more than left, then again just over half', () => {
    expect(logged).toHaveLength(34)
    expect([has('coffin-corner:right'), has('coffin-corner:left')]).toEqual([12, 6])
    expect([has('just-over-half:right'), has('just-over-half:left')]).toEqual([7, 3])
    expect(has('short-of-half:right')).toBe(3)
    const free = after('made-free-throw').filter(isPressed)
    expect(count(free, (row) => spotsOf(row).some((spot) => spot.startsWith('coffin-corner')))).toBe(7)
    const cues = trapped.map((row) => (Array.isArray(row.traps) ? row.traps[0]?.cue : null)).filter(Boolean)
    expect([cues.filter((cue) => cue === 'on-catch').length, cues.length]).toEqual([16, 24])
    const gotOut = trapped.filter((row) => {
      const result = Array.isArray(row.traps) ? row.traps[0]?.result : null
      return GOT_OUT.some((one) => one === result)
    })
    expect([count(gotOut, (row) => spotsOf(row).length > 1), gotOut.length]).toEqual([9, 16])
  })

  it('deny the pass back, leave the middle, keep the safety home', () => {
    const denied = pressed.filter((row) => Array.isArray(row.denied) && row.denied.length > 0)
    expect([count(denied, ({ denied: d }) => d?.includes('pass-back') ?? false), denied.length]).toEqual([
      14, 17,
    ])
    const open = trapped.filter((row) => Array.isArray(row.leftOpen))
    expect([count(open, ({ leftOpen }) => leftOpen?.includes('middle') ?? false), open.length]).toEqual([
      13, 18,
    ])
    const safety = trapped.filter(({ goalie }) => goalie === 'home' || goalie === 'left-early')
    expect(count(safety, ({ goalie }) => goalie === 'left-early')).toBe(2)
    expect(safety.length).toBeGreaterThanOrEqual(18)
  })

  it('let others through 23 of 34', () => {
    const ended = pressed.filter(({ outcome }) => outcome !== 'stopped')
    const through = count(ended, ({ outcome }) => SUCCESSES.some((one) => one === outcome))
    expect([through, ended.length]).toEqual([23, 34])
  })

  it('were not always seen', () => {
    expect(JSON.stringify(pressed)).toContain('not-visible')
    expect(pressed.some(({ traps }) => traps === 'not-visible')).toBe(true)
    expect(count(pressed, (row) => row.throwerGuard === undefined)).toBeGreaterThan(2)
  })
})

describe('what film adds', () => {
  const film = rows.filter((row) => row.filmTime !== undefined)

  it('is there for most rows, and the film runs forward', () => {
    expect(film.length).toBeGreaterThan(150)
    for (const game of new Set(film.map((row) => row.scoutedGameKey ?? row.gameKey))) {
      const times = film
        .filter((row) => (row.scoutedGameKey ?? row.gameKey) === game)
        .map((row) => row.filmTime ?? 0)
      expect(times).toEqual([...times].sort((a, b) => a - b))
    }
  })

  it('agrees with itself: whoever traps or steals is on the floor, five of them', () => {
    for (const row of film.filter(({ onFloor }) => onFloor)) {
      expect(row.onFloor, row.key).toHaveLength(5)
      const came = Array.isArray(row.traps) ? row.traps.flatMap(({ trappers }) => trappers ?? []) : []
      const stole = typeof row.thief === 'number' ? [row.thief] : []
      for (const number of [...came, ...stole]) expect(row.onFloor, row.key).toContain(number)
    }
  })

  it('counts points where there was a shot, and theirs only after a live loss', () => {
    for (const row of film) {
      if (row.finish === 'lay-up') expect(row.points).toBe(2)
      if (row.pointsAgainst != null) expect(row.outcome).toBe('lost-live')
      if (row.points != null) expect(row.finish).toBeTruthy()
    }
    expect(film.some(({ pointsAgainst }) => (pointsAgainst ?? 0) > 0)).toBe(true)
  })
})

describe('our own record', () => {
  const record = (counterKey: string, shape: string) => {
    const list = rows.filter((row) => row.counterKey === counterKey && row.shape === shape)
    return [count(list, ({ outcome }) => SUCCESSES.some((one) => one === outcome)), list.length]
  }

  it('stands where the book says', () => {
    expect(record('one-four', '1-2-1-1')).toEqual([18, 22])
    expect(record('box', '1-2-1-1')).toEqual([13, 18])
    expect(record('stack', '1-2-1-1')).toEqual([4, 6])
    expect(record('two-up', '1-2-1-1')).toEqual([5, 11])
    expect(record('two-up', '2-2-1')).toEqual([7, 8])
    expect(record('middle-three', '2-2-1')).toEqual([6, 7])
    expect(record('clear', 'person')).toEqual([0, 0])
  })

  it('has right calls that failed and wrong ones that worked', () => {
    const called = rows.filter(({ counterKey }) => counterKey !== null)
    const through = (row: DemoPossession) => SUCCESSES.some((one) => one === row.outcome)
    expect(called.some((row) => row.rightCall === true && row.runWell === true && !through(row))).toBe(true)
    expect(called.some((row) => row.rightCall === false && through(row))).toBe(true)
  })
})

describe('days', () => {
  it('has one game waiting at Choose, in three days, due the evening before', () => {
    const next = scenario.games.find(({ key }) => key === 'game-gulls')
    expect(next).toMatchObject({ tipOff: '2026-03-20T19:15:00.000Z', chooseBy: '2026-03-19T18:00:00.000Z' })
  })

  it('keeps the hour on the wall across the change to summer time', () => {
    const late = demoScenario(new Date('2026-03-27T12:00:00Z'), DEMO_TIME_ZONE)
    expect(late.games.find(({ key }) => key === 'game-gulls')?.tipOff).toBe('2026-03-30T18:15:00.000Z')
  })

  it('counts days from the day it is in the club, not in UTC', () => {
    const night = demoScenario(new Date('2026-07-01T23:30:00Z'), DEMO_TIME_ZONE)
    expect(night.scoutedGames.find(({ key }) => key === 'scout-gulls-3')?.playedOn).toBe('2026-06-29')
  })
})

describe('people and squad', () => {
  it('has a head coach, two assistants and a player, and somebody in two teams with two rule sets', () => {
    const roles = DEMO_PEOPLE.flatMap(({ key, memberships }) =>
      memberships.map(({ teamKey, role }) => `${key} ${teamKey} ${role}`),
    )
    expect(roles).toEqual([
      'maren u17 head-coach',
      'tomas u17 assistant-coach',
      'priya u17 assistant-coach',
      'priya u15 assistant-coach',
      'nell u17 player',
      'ines u15 head-coach',
    ])
    expect(new Set(demoTeams(NOW).map((team) => team.rulePack)).size).toBe(2)
    expect(demoTeams(NOW)[0]?.season).toBe('2025/26')
  })

  it('uses addresses that nobody can own, and passwords long enough', () => {
    for (const { email, password } of DEMO_PEOPLE) {
      expect(Email.parse(email)).toBe(email)
      expect(email.endsWith('.example')).toBe(true)
      expect(password.length).toBeGreaterThanOrEqual(LIMITS.passwordShortest)
    }
    const known = new Set(DEMO_PEOPLE.map(({ email }) => email))
    for (const { email } of DEMO_SIGN_INS) expect(known.has(email)).toBe(true)
  })

  it('has twelve players; Freya is out for the next game; every role but hers can be filled', () => {
    const squad = demoSquad(NOW, DEMO_TIME_ZONE)
    expect(squad).toHaveLength(12)
    expect(new Set(squad.map(({ jersey }) => jersey)).size).toBe(12)
    for (const player of squad) expect({ key: player.key, ...SquadPlayerBody.parse(player) }).toEqual(player)
    const fit = squad.filter(({ outUntil }) => outUntil === null)
    expect(
      squad.filter(({ outUntil }) => outUntil !== null).map(({ key, outUntil }) => [key, outUntil]),
    ).toEqual([['freya', '2026-03-21']])
    const at = (skill: 'handle' | 'long-arm' | 'decide') =>
      fit.filter(({ skills }) => skills[skill] >= 2).length
    expect([at('handle'), at('long-arm'), at('decide')]).toEqual([3, 2, 3])
    for (const counter of DEMO_COUNTERS)
      for (const { needs } of CounterBody.parse(counter).roles)
        expect(fit.some(({ skills }) => needs.every(({ skill, level }) => skills[skill] >= level))).toBe(true)
  })

  it('ties Nell’s account to her place in the squad', () => {
    const keys = new Set(demoSquad(NOW, DEMO_TIME_ZONE).map(({ key }) => key))
    for (const { memberships } of DEMO_PEOPLE)
      for (const { role, squadKey } of memberships) {
        expect(squadKey !== null).toBe(role === 'player')
        if (squadKey !== null) expect(keys.has(squadKey)).toBe(true)
      }
  })
})
