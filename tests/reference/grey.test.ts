import { describe, expect, it } from 'vitest'
import sharp from 'sharp'
import { hatchD, hatchOf, type HatchStep } from '@shared/court/hatch'
import { counterScene } from '@shared/court/counterScene'
import { penOf } from '@shared/court/pen'
import { rulePack } from '@shared/court/rulePacks'
import type { PathNode, Scene, SceneNode } from '@shared/court/scene'
import { ourToken, theirToken, tokenSize } from '@shared/court/tokens'
import { ACROSS } from '../shared/court/diagrams'
import { groupOf, pathsOf, textsOf } from '../shared/court/sceneParts'
import { pdfPng, scenePdf } from '../support/drawings'

/**
 * A grey copy loses nothing (DESIGN.md sections 1 and 2): measured on what comes out of the printer's own path,
 * pdfkit and poppler at 150 dots an inch. Lightness is CIE L*, 0 black to 100 white.
 */
const DPI = 150
const PT_PER_PX = 0.75

const linear = (value: number): number => {
  const c = value / 255
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
}
const lightness = (luminance: number): number =>
  luminance > 0.008856 ? 116 * Math.cbrt(luminance) - 16 : 903.3 * luminance

/** The luminance of every pixel of a drawing as printed at its own scale. */
async function printed(nodes: SceneNode[], metres: number, pxPerMetre: number): Promise<number[]> {
  const scene: Scene = { view: { x: 0, y: 0, width: metres, height: metres }, nodes, description: '' }
  const png = pdfPng(await scenePdf(scene, metres * pxPerMetre * PT_PER_PX), { dpi: DPI })
  const bytes = await sharp(png).flatten({ background: '#ffffff' }).removeAlpha().raw().toBuffer()
  return Array.from({ length: bytes.length / 3 }, (_, i) => {
    const [r = 0, g = 0, b = 0] = bytes.subarray(3 * i, 3 * i + 3)
    return 0.2126 * linear(r) + 0.7152 * linear(g) + 0.0722 * linear(b)
  })
}

const mean = (list: readonly number[]): number => list.reduce((sum, each) => sum + each, 0) / list.length

describe('hatch in grey', () => {
  const patch = async (step: HatchStep) => {
    const pen = penOf(16)
    const { gap, line } = hatchOf('paper', step)
    const box = { x: 0, y: 0, width: 10, height: 10 }
    const node: PathNode = {
      kind: 'path',
      d: hatchD(box, pen.px(gap)),
      stroke: 'their',
      strokeWidth: pen.px(line),
    }
    return printed([node], 10, 16)
  }

  it('has three steps at least 8 apart in mean lightness, the first clear of bare paper', async () => {
    const patches = await Promise.all(([1, 2, 3] as const).map(patch))
    // As an eye close by averages it (lightness of each dot) and as one far off does (light of all of them).
    for (const average of [
      (dots: readonly number[]) => mean(dots.map(lightness)),
      (dots: readonly number[]) => lightness(mean(dots)),
    ]) {
      const [one, two, three] = patches.map(average)
      expect(100 - one!).toBeGreaterThan(4)
      expect(one! - two!).toBeGreaterThanOrEqual(8)
      expect(two! - three!).toBeGreaterThanOrEqual(8)
    }
  })
})

describe('theirs and ours in one ink', () => {
  const pen = penOf(26)
  const METRES = 2
  const middle = { x: METRES / 2, y: METRES / 2 }

  /** Every stroke and fill in graphite: nothing is left but the shape. */
  const oneInk = (nodes: readonly SceneNode[]): SceneNode[] =>
    nodes.map((node) => {
      if (node.kind === 'group') return { ...node, nodes: oneInk(node.nodes) }
      if (node.kind === 'text') return { ...node, ink: dark(node.ink) }
      return { ...node, stroke: node.stroke && dark(node.stroke), fill: node.fill && dark(node.fill) }
    })
  const dark = (ink: NonNullable<PathNode['fill']>) =>
    ink === 'our' || ink === 'their' ? ('graphite' as const) : ink

  /** Of a circle round the token's middle, the share that is inked. */
  async function ringInked(nodes: readonly SceneNode[], radius: number): Promise<number> {
    const dots = await printed(oneInk(nodes), METRES, pen.pxPerMetre)
    const side = Math.sqrt(dots.length)
    const looks = Array.from({ length: 180 }, (_, i) => {
      const angle = (i * Math.PI) / 90
      const [x, y] = [middle.x + radius * Math.cos(angle), middle.y + radius * Math.sin(angle)].map((at) =>
        Math.floor((at / METRES) * side),
      )
      return (dots[(y ?? 0) * side + (x ?? 0)] ?? 1) < 0.4 ? 1 : 0
    })
    return mean(looks)
  }

  it.each([
    ['as on a sheet', tokenSize(pen, false)],
    ['small', tokenSize(pen, true)],
  ])(
    'has a ring all round each of ours, open or solid, and four arms on each of theirs, %s',
    async (_name, size) => {
      for (const solid of [true, false]) {
        const nodes = [ourToken(middle, '3', solid, size, pen)]
        expect(await ringInked(nodes, size.r)).toBeGreaterThan(0.95)
      }
      const theirs = [theirToken(middle, 'X3', size, pen)]
      expect(await ringInked(theirs, size.r * 0.5)).toBeGreaterThan(0.1)
      expect(await ringInked(theirs, size.r * 0.5)).toBeLessThan(0.6)
      expect(await ringInked(theirs, size.r)).toBe(0)
    },
  )

  it('ends our way in a filled head of three corners, theirs in an open one of four', () => {
    const diagram = structuredClone(ACROSS)
    diagram.steps[0]!.moves.push({ kind: 'theirs', who: 'X2', to: { x: 0.3, y: 0.2 }, bend: 0, beat: 0 })
    const scene = counterScene({ diagram, pack: rulePack('fiba'), pxPerMetre: 26, step: 0 })
    const head = (id: string) => pathsOf(groupOf(scene, id)!.nodes).find(({ d }) => d.endsWith('Z'))!
    const corners = ({ d }: PathNode) => d.split(/[ML]/).length - 1
    expect(corners(head('move-0-0'))).toBe(3)
    expect(head('move-0-0').fill).toBe('our')
    expect(corners(head('move-0-2'))).toBe(4)
    expect(head('move-0-2').fill).toBe('floor')
  })

  it('numbers ours and leaves theirs bare', () => {
    const size = tokenSize(pen, false)
    expect(textsOf([ourToken(middle, '3', false, size, pen)]).map(({ text }) => text)).toEqual(['3'])
    expect(textsOf([theirToken(middle, 'X3', size, pen)])).toEqual([])
  })
})
