import { mount, RouterLinkStub } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import type { GameRow } from '@shared/games/schemas'
import PrepRail from '@/components/PrepRail.vue'
import SmallRail from '@/components/SmallRail.vue'
import { railOf } from '@/composables/prepRail'

const game: GameRow = {
  id: '44444444-4444-4444-8444-000000000101',
  version: 1,
  createdAt: '2026-03-01T10:00:00.000Z',
  updatedAt: '2026-03-01T10:00:00.000Z',
  opponentId: '44444444-4444-4444-8444-000000000001',
  opponentName: 'Port Selby Gulls',
  tipOff: '2026-03-20T19:15:00.000Z',
  place: 'home',
  rulePack: 'fiba',
  chooseBy: '2026-03-18T18:00:00.000Z',
  due: { scout: null, read: null, teach: null, review: null },
  notes: '',
  station: 'choose',
  holder: { id: '44444444-4444-4444-8444-000000000201', name: 'Maren Oduya', initials: 'MO' },
  read: null,
  handedOn: null,
  mayHandOn: false,
  counts: { possessions: 58, scoutedGames: 3, ourGames: 0 },
  plan: null,
  headCoach: { name: 'Maren Oduya', initials: 'MO' },
}

describe('railOf', () => {
  it('has everything before the station done and everything after it ahead', () => {
    const { stations, tipOff } = railOf(game, 'Europe/London')
    expect(stations.map((each) => each.state)).toEqual(['done', 'done', 'here', 'ahead', 'ahead'])
    expect(stations[0]!.what).toBe('58 possessions, 3 games')
    expect(stations[2]).toMatchObject({ holder: 'MO', what: 'With Maren, due Wed 18:00' })
    expect(tipOff.when).toBe('Fri 19:15')
  })

  it('says when the plan was signed, once it was', () => {
    const signed = { id: game.id, number: 1, signedAt: '2026-03-17T21:14:00.000Z' }
    const { stations } = railOf({ ...game, station: 'teach', plan: signed }, 'Europe/London')
    expect(stations[2]!.what).toBe('Signed off Tue 21:14')
    expect(stations[3]).toMatchObject({ holder: 'MO', what: 'With Maren' })
  })

  it('says whose a station is and when it is due, and nobody where nobody has the ball', () => {
    const due = {
      scout: null,
      read: '2026-03-17T18:00:00.000Z',
      teach: '2026-03-19T17:30:00.000Z',
      review: null,
    }
    const tomas = { id: '44444444-4444-4444-8444-000000000202', name: 'Tomas Reyl', initials: 'TR' }
    const { stations } = railOf({ ...game, station: 'read', holder: tomas, due }, 'UTC')
    expect(stations[1]).toMatchObject({ holder: 'TR', what: 'With Tomas, due Tue 18:00' })
    expect(stations[3]!.what).toBe('due Thu 17:30')
    const nobody = railOf({ ...game, station: 'read', holder: null, due }, 'UTC').stations[1]
    expect(nobody).toMatchObject({ what: 'due Tue 18:00' })
    expect(nobody!.holder).toBeUndefined()
  })

  it('claims no count where nothing is counted, and no page where none is built', () => {
    const fresh = {
      ...game,
      station: 'scout' as const,
      counts: { possessions: 0, scoutedGames: 2, ourGames: 0 },
    }
    const { stations } = railOf(fresh, 'UTC', 'team')
    expect(stations[0]!.what).toBe('Nothing counted yet')
    expect(stations.map((each) => each.to !== undefined)).toEqual([true, true, true, true, false])
  })
})

describe('PrepRail', () => {
  const rail = (page: 'read' | 'choose' | null = 'read') =>
    mount(PrepRail, {
      props: { ...railOf(game, 'UTC', 'team'), page },
      global: { stubs: { RouterLink: RouterLinkStub } },
    })

  it('stands the tip-off between Teach and Review', () => {
    const names = rail()
      .findAll('li .name')
      .map((name) => name.text().split(',')[0])
    expect(names).toEqual(['Scout', 'Read', 'Choose', 'Teach', 'Tip-off', 'Review'])
  })

  it('underlines the open page, which is no link to itself', () => {
    const open = rail().find('[aria-current="page"]')
    expect(open.text()).toContain('Read')
    expect(open.findComponent(RouterLinkStub).exists()).toBe(false)
    expect(rail(null).find('[aria-current]').exists()).toBe(false)
  })

  it('has one ball, with the holder, and says each state in words', () => {
    const wrapper = rail()
    expect(wrapper.findAll('.is-here .disc').map((disc) => disc.text())).toEqual(['MO'])
    expect(wrapper.findAll('.is-done svg')).toHaveLength(2)
    expect(wrapper.text()).toContain('Choose, the ball is here')
    expect(wrapper.text()).toContain('Scout, done')
  })
})

describe('SmallRail', () => {
  it('says where the work stands', () => {
    const label = (stations: ReturnType<typeof railOf>['stations']) =>
      mount(SmallRail, { props: { stations } }).attributes('aria-label')
    const { stations } = railOf(game, 'UTC')
    expect(label(stations)).toBe('At Choose, with MO')
    expect(label(stations.map((each) => ({ ...each, state: 'ahead' as const })))).toBe('Not begun')
    expect(label(stations.map((each) => ({ ...each, state: 'done' as const })))).toBe('Reviewed')
  })
})
