import { describe, expect, it } from 'vitest'
import { sizeInWords } from '@server/backup/files'
import { differingRows, readManifest, type Manifest } from '@server/backup/manifest'
import { namesOver } from '@server/backup/retention'
import { instantOf, stampOf } from '@server/backup/stamp'

const NOW = new Date('2026-03-17T09:42:07.512Z')

describe('a stamp', () => {
  it('is the instant to the second, in UTC, and reads back', () => {
    expect(stampOf(NOW)).toBe('2026-03-17T094207Z')
    expect(instantOf('2026-03-17T094207Z')).toEqual(new Date('2026-03-17T09:42:07Z'))
  })

  it.each([
    '',
    'stills',
    '2026-03-17',
    '2026-13-40T094207Z',
    '2026-03-17T094207Z.part',
    'x2026-03-17T094207Z',
  ])('is not read from %s', (name) => {
    expect(instantOf(name)).toBeNull()
  })
})

describe('what is over', () => {
  it('is what is older than the days, to the second, and never a name that is not ours', () => {
    const names = ['2026-02-15T094207Z', '2026-02-15T094208Z', '2026-03-17T094200Z', 'photos', '.gitkeep']
    expect(namesOver(names, 30, NOW)).toEqual({ kept: ['2026-02-15T094207Z'], unfinished: [] })
  })

  it('takes what a restore set aside like a backup, and half-written folders after a day', () => {
    const names = [
      'before-restore-2026-01-01T000000Z',
      'before-restore-2026-03-16T000000Z',
      '2026-03-16T094206Z.part',
      '2026-03-17T094206Z.part',
      'restoring-2026-03-01T000000Z',
      'restoring-2026-03-17T094200Z',
    ]
    expect(namesOver(names, 30, NOW)).toEqual({
      kept: ['before-restore-2026-01-01T000000Z'],
      unfinished: ['2026-03-16T094206Z.part', 'restoring-2026-03-01T000000Z'],
    })
  })
})

const manifest: Manifest = {
  format: 1,
  madeAt: '2026-03-17T09:42:07.512Z',
  newestMigration: 'FirstTables1796126400000',
  rows: { teams: 1 },
  files: [{ path: 'overtop.sqlite', bytes: 4096, sha256: 'a'.repeat(64) }],
}
const file = (path: string) => ({ ...manifest, files: [{ path, bytes: 1, sha256: 'a'.repeat(64) }] })

describe('a manifest', () => {
  it('reads back as it was written', () => {
    expect(readManifest(JSON.stringify(manifest))).toEqual(manifest)
    const still = file(
      'stills/11111111-1111-4111-8111-111111111111/22222222-2222-4222-8222-222222222222.thumb.jpg',
    )
    expect(readManifest(JSON.stringify(still))).toEqual(still)
  })

  it.each([
    ['cut off', JSON.stringify(manifest).slice(0, 40)],
    ['without files', JSON.stringify({ ...manifest, files: [] })],
    ['that names a file outside', JSON.stringify(file('../overtop.sqlite'))],
    ['that names a file outside by way of the stills', JSON.stringify(file('stills/../session-secret'))],
    ['that names the secret', JSON.stringify(file('session-secret'))],
  ])('%s is damaged', (_what, text) => {
    expect(readManifest(text)).toEqual({ fault: 'manifest.json is damaged' })
  })

  it('of a format to come says so', () => {
    expect(readManifest('{"format":2}')).toEqual({
      fault: 'its format is 2 and this version of Overtop reads 1',
    })
  })

  it('is held against the rows that are there, table by table', () => {
    expect(differingRows({ teams: 1, stills: 2 }, { teams: 1, stills: 2 })).toEqual([])
    expect(differingRows({ teams: 1, stills: 2 }, { teams: 1, stills: 1, traps: 0 })).toEqual([
      'stills: 2 listed, 1 found',
      'traps: none listed, 0 found',
    ])
  })
})

describe('a size in words', () => {
  it.each([
    [999, '999 bytes'],
    [1000, '1.0 kB'],
    [3_449_000, '3.4 MB'],
    [2_000_000_000_000_000, '2000.0 TB'],
  ])('%d is %s', (bytes, words) => {
    expect(sizeInWords(bytes)).toBe(words)
  })
})
