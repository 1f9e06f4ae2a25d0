import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { inSpot } from '@server/database/counting/expressions'
import { createDataSource } from '@server/database/dataSource'
import { SPOT_CELLS, spotAt } from '@shared/court/trapSpots'

let db: DataSource

beforeAll(async () => {
  db = await createDataSource(':memory:').initialize()
})
afterAll(() => db.destroy())

const SPOT = SPOT_CELLS.map(({ spot, side }) => `(${inSpot(spot, side)}) AS "${spot} ${side}"`).join(', ')

/** The spots that hold a place by the SQL; more than one would be counted twice. */
async function inSql(x: number, y: number): Promise<string[]> {
  const [row]: Record<string, number>[] = await db.query(`SELECT ${SPOT} FROM (SELECT ? AS x, ? AS y) t`, [
    x,
    y,
  ])
  return Object.entries(row ?? {}).flatMap(([spot, holds]) => (holds === 1 ? [spot] : []))
}

const byFunction = (x: number, y: number): string[] => {
  const { spot, side } = spotAt({ x, y } as Parameters<typeof spotAt>[0])
  return spot === 'other' ? [] : [`${spot} ${side}`]
}

/** The next double above or below: a boundary is only held when its neighbours are. */
function beside(value: number, direction: 1 | -1): number {
  const bits = new DataView(new ArrayBuffer(8))
  bits.setFloat64(0, value)
  bits.setBigInt64(0, bits.getBigInt64(0) + BigInt(direction))
  return bits.getFloat64(0)
}

const inside = (values: number[]) => values.filter((value) => value >= 0 && value <= 1)
const withNeighbours = (values: number[]) =>
  inside([
    ...values,
    ...values.flatMap((value) => (value === 0 ? [beside(0, 1)] : [beside(value, 1), beside(value, -1)])),
  ])
const XS = withNeighbours([0, 0.16, 0.38, 0.5, 0.55, 0.62, 0.84, 1])
const YS = withNeighbours([0, 0.22, 0.33, 0.5, 0.67, 0.78, 1])

describe('the trap spot in SQL', () => {
  it('is the trap spot of the court on every boundary and the doubles beside it', async () => {
    for (const x of XS) for (const y of YS) expect(await inSql(x, y), `${x}, ${y}`).toEqual(byFunction(x, y))
  })

  it('is the trap spot of the court at any place', async () => {
    const near = (list: number[]) =>
      fc.oneof(
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.constantFrom(...list),
        fc.integer({ min: 0, max: 1000 }).map((n) => n / 1000),
      )
    await fc.assert(
      fc.asyncProperty(near(XS), near(YS), async (x, y) => {
        expect(await inSql(x, y)).toEqual(byFunction(x, y))
      }),
      { numRuns: 500 },
    )
  })

  it('mirrors: what is left at y is right at 1 - y', async () => {
    const swap: Record<string, string> = { left: 'right', right: 'left', middle: 'middle' }
    for (const x of XS)
      for (const y of YS) {
        const mirrored = (await inSql(x, y)).map((cell) => cell.replace(/\w+$/, (side) => swap[side] ?? side))
        expect(await inSql(x, 1 - y), `${x}, ${y}`).toEqual(mirrored)
      }
  })
})
