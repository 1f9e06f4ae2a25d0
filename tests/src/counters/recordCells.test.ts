import { describe, expect, it } from 'vitest'
import { wilson } from '@shared/stats/wilson'
import { byRecord, findCounters, recordCells, thinnestWords, totalCells } from '@/views/counters/recordCells'

const record = [
  { shape: '1-2-1-1', k: 18, n: 22 },
  { shape: '2-2-1', k: 2, n: 4 },
  { shape: 'dropped-back', k: 9, n: 9 },
]

describe('our record, press by press', () => {
  it('has a cell for every press, with the raw count’s own range', () => {
    const cells = recordCells(record)
    expect(cells.map((cell) => cell.shape)).toEqual(['1-2-1-1', '2-2-1', '1-3-1', 'other-zone', 'person'])
    expect(cells[0]).toMatchObject({ k: 18, n: 22, range: wilson(18, 22), thin: false })
    expect(cells[1]).toMatchObject({ k: 2, n: 4, thin: true })
    expect(cells[2]).toMatchObject({ k: 0, n: 0, range: null })
  })

  it('adds up over the counters in view, and names the press with the fewest tries', () => {
    const totals = totalCells([{ record }, { record: [{ shape: '2-2-1', k: 7, n: 8 }] }])
    expect(totals[1]).toMatchObject({ k: 9, n: 12 })
    expect(thinnestWords(totals)).toBe('Thinnest: 2-2-1, only 12 tries')
    expect(thinnestWords(totalCells([{ record: [] }]))).toBe('')
  })

  it('puts first what surely got us through, so that two of two does not lead', () => {
    const rows = [
      { name: 'New', record: [] },
      { name: 'Lucky', record: [{ shape: 'person', k: 2, n: 2 }] },
      { name: 'Tried', record: [{ shape: 'person', k: 18, n: 22 }] },
    ]
    expect(byRecord(rows).map((row) => row.name)).toEqual(['Tried', 'Lucky', 'New'])
  })
})

describe('finding a counter', () => {
  const rows = [
    { name: 'Box, big in the middle', call: 'Box', alignment: 'Two low, two high', family: 'box' as const },
    { name: 'Middle three', call: 'Middle', alignment: 'Three across', family: 'diamond' as const },
  ]

  it('looks in name, call and alignment, whatever the case', () => {
    expect(findCounters(rows, ' MIDDLE', '')).toHaveLength(2)
    expect(findCounters(rows, 'two low', '').map((row) => row.call)).toEqual(['Box'])
  })

  it('keeps to a family', () => {
    expect(findCounters(rows, 'middle', 'diamond').map((row) => row.call)).toEqual(['Middle'])
    expect(findCounters(rows, '', 'stack')).toEqual([])
  })
})
