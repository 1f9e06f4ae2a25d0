import { describe, expect, it } from 'vitest'
import { FIGURES } from '@shared/team/figures'
import { TeamBody, type TeamRow } from '@shared/team/settings'
import { bodyOf, formOf, isChanged } from '@/views/team/teamForm'

const row: TeamRow = {
  id: 'a3bb189e-8bf9-4888-9912-ace4e6543002',
  version: 3,
  ...TeamBody.parse({
    name: 'Herons',
    squadName: 'U17 girls',
    timeZone: 'Europe/London',
    season: '2026/27',
    rulePack: 'fiba',
    settings: { figures: { strong: 0.9 }, ownCourt: { length: 26, backcourtSeconds: 10 } },
  }),
}

describe('the team form', () => {
  it('shows every figure, set or not, and sends only what differs', () => {
    const form = formOf(row)
    expect(form.figures).toMatchObject({ strong: 0.9, light: FIGURES.light.value })
    expect(bodyOf(form).settings.figures).toEqual({ strong: 0.9 })
    expect(
      bodyOf({ ...form, figures: { ...form.figures, strong: FIGURES.strong.value } }).settings.figures,
    ).toEqual({})
  })

  it('sends the sides that differ from the book, and no court without one', () => {
    const form = formOf(row)
    expect(bodyOf(form).settings.ownCourt).toEqual({ length: 26, backcourtSeconds: 10 })
    expect(bodyOf({ ...form, ownCourt: false }).settings.ownCourt).toBeNull()
  })

  it('knows whether anything is changed', () => {
    const form = formOf(row)
    expect(isChanged(form, row)).toBe(false)
    expect(isChanged({ ...form, name: 'Terns' }, row)).toBe(true)
  })
})
