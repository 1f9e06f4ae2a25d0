import { describe, expect, it } from 'vitest'
import { OpponentBody } from '@shared/opponents/schemas'
import { GameBody } from '@shared/games/schemas'
import { bodiesOf, nextSlot, shortOf, timeOf, type Meeting } from '@/views/opponents/meeting'

const ID = '44444444-4444-4444-8444-000000000001'
const whole: Meeting = {
  name: ' Kelder Mouth Puffins ',
  shortName: '',
  date: '2026-05-02',
  time: '14:00',
  place: 'away',
}

describe('the sentence', () => {
  it('asks for its slots in order and is whole at the end', () => {
    const said: Meeting = { name: '', shortName: '', date: '', time: '', place: '' }
    const order: (string | null)[] = [nextSlot(said)]
    said.name = 'Puffins'
    order.push(nextSlot(said))
    said.place = 'home'
    said.date = '2026-05-02'
    order.push(nextSlot(said))
    said.time = '14:00'
    order.push(nextSlot(said))
    expect(order).toEqual(['name', 'date', 'time', null])
  })

  it('makes two bodies that the server takes, the time in the zone of the team', () => {
    const bodies = bodiesOf(whole, ID, 'fiba', 'Europe/London')!
    expect(OpponentBody.parse(bodies.opponent)).toEqual({
      name: 'Kelder Mouth Puffins',
      shortName: 'Puffins',
      notes: '',
    })
    expect(GameBody.parse(bodies.game)).toMatchObject({ opponentId: ID, tipOff: '2026-05-02T13:00:00.000Z' })
  })

  it('makes none while a slot is open', () => {
    expect(bodiesOf({ ...whole, place: '' }, ID, 'fiba', 'UTC')).toBeNull()
    expect(bodiesOf({ ...whole, name: '  ' }, ID, 'fiba', 'UTC')).toBeNull()
  })

  it('keeps the short name within what the schema takes', () => {
    expect(shortOf('Llanfairpwllgwyngyllgogerychwyrn')).toHaveLength(20)
    expect(shortOf('')).toBe('')
  })
})

describe('timeOf', () => {
  it.each([
    ['19:15', '19:15'],
    ['19.15', '19:15'],
    ['1915', '19:15'],
    ['7:15', '07:15'],
    ['915', '09:15'],
    ['19 h', '19:00'],
    [' 8 ', '08:00'],
  ])('reads %j as %s', (typed, time) => expect(timeOf(typed)).toBe(time))

  it.each(['', '25:00', '19:60', '7 pm', 'noon', '19:5', '12345'])('does not guess %j', (typed) =>
    expect(timeOf(typed)).toBeNull(),
  )
})
