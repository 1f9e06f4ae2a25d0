import { PossessionBody, type PossessionRow } from '@shared/possessions/schemas'
import type { TableRow } from '@shared/possessions/table'
import { rulePack } from '@shared/court/rulePacks'

export const FIBA = rulePack('fiba')
export const GAME = '6f1f7c9e-3f53-4a9e-9a53-0d1f6f0b7f10'
export const idOf = (number: number) => `0b0c7c0e-8a8e-4d58-9d5f-1d9a3a1f0a${String(number).padStart(2, '0')}`

/** A row as the server hands it over: pressed, in a 1-2-1-1, kept. */
export function rowOf(number: number, fields: Partial<PossessionRow> = {}): PossessionRow {
  const body = PossessionBody.parse({
    scoutedGameId: GAME,
    number,
    trigger: 'made-basket',
    shape: '1-2-1-1',
    pickup: 'full',
    outcome: 'through',
  })
  return {
    ...body,
    traps: null,
    id: idOf(number),
    version: 1,
    createdAt: '2026-03-14T14:41:00.000Z',
    updatedAt: '2026-03-14T14:41:00.000Z',
    pressed: true,
    stills: [],
    ...fields,
  }
}

export const tableRow = (possession: PossessionRow, fixes: TableRow['fixes'] = []): TableRow => ({
  possession,
  game: { id: GAME, kind: 'scouted', label: 'v Tarn Valley', playedOn: '2026-03-14' },
  fixes,
})
