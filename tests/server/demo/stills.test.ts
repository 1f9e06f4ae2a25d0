import { describe, it, expect } from 'vitest'
import sharp from 'sharp'
import { LIMITS } from '@shared/limits'
import { StillFields } from '@shared/stills/schemas'
import { DEMO_POSSESSIONS } from '@server/database/demo/scenario'
import { DEMO_STILLS, renderStill } from '@server/database/demo/stills'
import { marksOn } from '@server/database/demo/stills/marks'
import { marksOf, StillMarks } from '@shared/stills/marks'

describe('the invented stills', () => {
  it('hang on rows that exist, within the limits, with eight words at most', () => {
    const keys = new Set(DEMO_POSSESSIONS.map(({ key }) => key))
    expect(DEMO_STILLS).toHaveLength(12)
    expect(new Set(DEMO_STILLS.map(({ spec }) => spec.seed)).size).toBe(12)
    for (const { possessionKey, t, caption } of DEMO_STILLS) {
      expect(keys.has(possessionKey)).toBe(true)
      expect(StillFields.parse({ t: t === null ? '' : String(t), caption })).toEqual({ t, caption })
      expect(caption.split(' ').length).toBeLessThanOrEqual(8)
    }
  })

  it('agree with the traps of their rows', () => {
    const rows = new Map(DEMO_POSSESSIONS.map((row) => [row.key, row]))
    for (const { possessionKey, t, caption } of DEMO_STILLS.filter((still) =>
      still.caption.includes('rapped'),
    )) {
      const traps = rows.get(possessionKey)?.traps
      const trap = Array.isArray(traps) ? traps.find((one) => one.t === t) : undefined
      expect(trap, caption).toBeDefined()
      if (caption.includes('left')) expect(trap?.y).toBeLessThan(0.5)
      if (caption.includes('right')) expect(trap?.y).toBeGreaterThan(0.5)
      if (caption.includes('past half')) expect(trap?.x).toBeGreaterThan(0.5)
    }
  })

  it('carry marks inside the picture that agree with their row', () => {
    const rows = new Map(DEMO_POSSESSIONS.map((row) => [row.key, row]))
    const drawn = DEMO_STILLS.map((still) => ({ ...still, marks: marksOn(still.spec) }))
    for (const { possessionKey, caption, marks } of drawn) {
      expect(StillMarks.safeParse(marks).success, caption).toBe(true)
      expect(marksOf(marks)).toEqual(marks)
      expect(marks.ring, caption).not.toBeNull()
      const leftOpen = rows.get(possessionKey)?.leftOpen
      if (marks.shade) expect(leftOpen, caption).toContain('middle')
    }
    // The one whose words say it shows it: the room, and the pass into it.
    const { marks } = drawn.find(({ caption }) => caption.includes('The middle is open')) ?? {}
    const { shade, pass } = marks ?? {}
    expect(shade && pass && pass.to.x > shade.x && pass.to.x < shade.x + shade.w).toBe(true)
    expect(drawn.filter((still) => still.marks.pass).length).toBeGreaterThanOrEqual(6)
  })

  it(
    'are grey JPEG pictures under 300 kB, the same each time, and not blank',
    { timeout: 30_000 },
    async () => {
      const [first, , third] = DEMO_STILLS
      for (const still of [first!, third!]) {
        const picture = await renderStill(still.spec)
        expect(picture.length).toBeLessThan(300_000)
        expect(picture.length).toBeLessThan(LIMITS.stillBytes)
        expect(await sharp(picture).metadata()).toMatchObject({ format: 'jpeg', width: 1600, height: 900 })
        const { channels } = await sharp(picture).stats()
        expect(channels[0]!.stdev).toBeGreaterThan(30)
        expect(await renderStill(still.spec)).toEqual(picture)
      }
    },
  )
})
