import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'

/**
 * WCAG 2.2, relative luminance and contrast ratio (https://www.w3.org/TR/WCAG22/#dfn-contrast-ratio), success
 * criteria 1.4.3 (text 4.5) and 1.4.11 (parts and graphics 3).
 */
type Rgb = readonly [number, number, number]

function rgb(hex: string): Rgb {
  const found = /^#([\da-f]{2})([\da-f]{2})([\da-f]{2})$/i.exec(hex)
  if (found === null) throw new Error(`${hex} is no colour of six figures`)
  return [found[1]!, found[2]!, found[3]!].map((part) => Number.parseInt(part, 16)) as unknown as Rgb
}

function luminance(hex: string): number {
  const [r, g, b] = rgb(hex).map((part) => {
    const share = part / 255
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
  }) as unknown as Rgb
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number]
  return (high + 0.05) / (low + 0.05)
}

describe('the contrast formula against published ratios on white (WCAG 2.2)', () => {
  it.each([
    ['#000000', 21],
    ['#767676', 4.5422],
    ['#777777', 4.4781],
    ['#949494', 3.0335],
    ['#595959', 7.0047],
  ])('%s is %f', (hex, ratio) => {
    expect(contrast(hex, '#ffffff')).toBeCloseTo(ratio, 4)
  })
})

const css = readFileSync(new URL('../../src/styles/tokens.css', import.meta.url), 'utf8').replace(
  /\/\*[\s\S]*?\*\//g,
  '',
)

/** The colours that one block of the file sets. */
function block(selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`)
  if (start < 0) throw new Error(`tokens.css has no block ${selector}`)
  const body = css.slice(start, css.indexOf('}', start))
  return Object.fromEntries(
    [...body.matchAll(/(--[\w-]+):\s*(#[\da-f]{6})\s*;/gi)].map(([, name, value]) => [name!, value!]),
  )
}

const light = block(':root')
const MODES: Record<string, Record<string, string>> = {
  'lights up': light,
  'lights down': { ...light, ...block("[data-lights='down']") },
  hall: { ...light, ...block('.hall') },
}

/** Words stand on the four papers. */
const PAPERS = ['--desk', '--paper', '--sheet', '--floor']
const TEXTS = ['--graphite', '--graphite-2', '--graphite-3', '--their', '--our', '--our-deep']

describe.each(Object.entries(MODES))('theme, %s', (_mode, tokens) => {
  const ratio = (front: string, back: string) => contrast(tokens[front]!, tokens[back]!)

  it.each(TEXTS.flatMap((text) => PAPERS.map((paper) => [text, paper] as const)))(
    'words in %s on %s reach 4.5',
    (text, paper) => {
      expect(ratio(text, paper)).toBeGreaterThanOrEqual(4.5)
    },
  )

  it.each([
    ['--on', '--their'],
    ['--on', '--our'],
    ['--on', '--our-deep'],
    ['--on', '--graphite'],
    ['--on', '--graphite-2'],
    ['--on-ball', '--ball'],
    ['--our', '--our-wash'],
    ['--graphite', '--our-wash'],
  ])('words in %s on a fill of %s reach 4.5', (text, fill) => {
    expect(ratio(text, fill)).toBeGreaterThanOrEqual(4.5)
  })

  it.each([
    // Control edges and the court's markings carry meaning; rules and the axis are decoration.
    ['--edge', '--sheet'],
    ['--edge', '--paper'],
    ['--court-line', '--floor'],
    ['--their', '--floor'],
    ['--our', '--floor'],
    ['--graphite', '--floor'],
  ])('%s on %s reaches 3, as parts and graphics must', (front, back) => {
    expect(ratio(front, back)).toBeGreaterThanOrEqual(3)
  })
})

describe('the ratios that the design states', () => {
  it.each([
    ['--graphite', '--paper', 14.2],
    ['--graphite-2', '--sheet', 7.8],
    ['--graphite-3', '--floor', 5.3],
    ['--their', '--floor', 5.1],
    ['--our', '--paper', 7.7],
    ['--our-deep', '--sheet', 11.4],
    ['--court-line', '--floor', 3.2],
    ['--edge', '--sheet', 3.9],
  ])('%s on %s is %f', (front, back, stated) => {
    expect(contrast(light[front]!, light[back]!)).toBeCloseTo(stated, 1)
  })
})
