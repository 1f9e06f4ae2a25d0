import { describe, expect, it } from 'vitest'
import { SquadPlayerBody, type SquadPlayerRow } from '@shared/squad/schemas'
import { bodyOfForm, differences, faultsOf, formOf, isChanged, squadWords } from '@/views/squad/playerForm'

const row: SquadPlayerRow = {
  id: '00000000-0000-4000-8000-000000000001',
  version: 3,
  createdAt: '2026-01-01T00:00:00.000Z',
  updatedAt: '2026-01-01T00:00:00.000Z',
  jersey: 10,
  firstName: 'Bea',
  lastName: 'Quill',
  skills: { handle: 0, 'throw-in': 1, 'long-arm': 1, decide: 1, sprint: 1, screen: 2 },
  outUntil: null,
  guardianEmail: 'odd.quill@post.example',
  pictureConsent: 'no',
  sprint20: 3.52,
  available: true,
}
const others = [{ jersey: 4, firstName: 'Nell' }]

describe('a player’s form', () => {
  it('comes back as the body it was made from', () => {
    expect(SquadPlayerBody.parse(bodyOfForm(formOf(row)))).toEqual({
      jersey: 10,
      firstName: 'Bea',
      lastName: 'Quill',
      skills: row.skills,
      outUntil: null,
      guardianEmail: 'odd.quill@post.example',
      pictureConsent: 'no',
      sprint20: 3.52,
    })
  })

  it('takes the guardian’s address and a sprint as they are typed, and refuses what is neither', () => {
    const typed = { ...formOf(row), guardianEmail: ' Ewa@Post.Example ', sprint20: '3,41' }
    expect(faultsOf(typed, others)).toEqual({})
    expect(bodyOfForm(typed)).toMatchObject({ guardianEmail: 'ewa@post.example', sprint20: 3.41 })
    const wrong = faultsOf({ ...formOf(row), guardianEmail: 'ewa', sprint20: 'fast' }, others)
    expect(Object.keys(wrong)).toEqual(['guardianEmail', 'sprint20'])
    expect(faultsOf({ ...formOf(row), sprint20: '12' }, others).sprint20).toBeDefined()
    const none = bodyOfForm({ ...formOf(row), guardianEmail: ' ', sprint20: '' })
    expect(none).toMatchObject({ guardianEmail: null, sprint20: null })
  })

  it('starts empty for somebody new, and says what is missing', () => {
    expect(Object.keys(faultsOf(formOf(null), others)).sort()).toEqual(['firstName', 'jersey'])
  })

  it('refuses a number that is worn, also written with a nought before it', () => {
    expect(faultsOf({ ...formOf(row), jersey: '04' }, others).jersey).toBe('Number 4 is worn by Nell.')
    expect(faultsOf({ ...formOf(row), jersey: '100' }, others).jersey).toBe('A number from 0 to 99.')
    expect(faultsOf({ ...formOf(row), jersey: '0' }, others)).toEqual({})
  })

  it('refuses a day that is none and names that are too long', () => {
    expect(faultsOf({ ...formOf(row), outUntil: '18 March' }, others).outUntil).toBeDefined()
    expect(faultsOf({ ...formOf(row), outUntil: '2026-03-18' }, others)).toEqual({})
    expect(faultsOf({ ...formOf(row), lastName: 'x'.repeat(41) }, others).lastName).toBe(
      '40 letters at most.',
    )
  })

  it('knows whether anything was typed, and never changes the row by typing', () => {
    const form = formOf(row)
    expect(isChanged(form, row)).toBe(false)
    form.skills.handle = 3
    expect(isChanged(form, row)).toBe(true)
    expect(row.skills.handle).toBe(0)
  })

  it('names what somebody else saved differently, in the words of the page', () => {
    const theirs = { ...row, outUntil: '2026-03-18', skills: { ...row.skills, sprint: 3 } }
    expect(differences(formOf(row), theirs)).toEqual(['Out through: 2026-03-18', 'sprints: our best'])
    expect(differences(formOf(row), row)).toEqual([])
    expect(differences(formOf(row), { ...row, pictureConsent: 'yes', sprint20: 3.4 })).toEqual([
      'Sprint over 20 m, seconds: 3.4',
      'Pictures: said yes',
    ])
  })
})

describe('the line under the title', () => {
  it('counts players and who is out', () => {
    expect(squadWords([{ available: true }, { available: false }])).toBe('Two players. One out today.')
    expect(squadWords([{ available: true }])).toBe('One player. All there today.')
    expect(squadWords([])).toBe('No players.')
  })
})
