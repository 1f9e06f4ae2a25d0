import type { Role } from '../vocabulary'
import { sheetContent, type Copy, type PressLine, type SheetContent } from './content'
import { pressDrawing, textsOf, wayDrawing } from './drawings'
import { readBy } from './reader'
import type { FrozenCounter, SheetView } from './schemas'

/** The fuller page: the most words, without names, and the smallest body in pt that it may be printed in. */
export const FULLER_BUDGET = { words: 150, steps: 4, bodyPt: 9.5 } as const

/** Said before the fuller page may be chosen. */
export const FULLER_WARNING =
  'Players keep five to seven things. The light sheet is read in two minutes; a fuller one is read once and forgotten. Choose it for a team that has run this before.'

/** Everything on the fuller page, for one reader. Players' names have fields of their own. */
export interface FullerContent extends Pick<SheetContent, 'title' | 'when' | 'unknown' | 'keys' | 'foot'> {
  lines: PressLine[]
  way: { heading: string; steps: { index: number; number: number; title: string; solid: Role | null }[] }
  five: { role: Role; name: string | null; jersey: number | null; own: boolean }[]
  /** Passing options in order; "if the first is not on, the next". */
  looks: string[]
  changeUp: { heading: string; text: string } | null
  drawn: string[]
}

/** What stands on the fuller page for the reader that the view names (`mine`), or for everybody. */
export function fullerContent(view: Omit<SheetView, 'budget'>, copy: Copy = {}): FullerContent {
  const { content, mine } = view
  const light = sheetContent(view, copy)
  const { firstCall, changeUp } = content
  const you = mine?.firstCallRole ?? null
  const shown = { counter: 'firstCall', you } as const
  const steps = stepsShown(firstCall, you)
  const five = firstCall.roles.map(({ role, squadPlayerId }) => {
    const player = view.players.find((one) => one.squadPlayerId === squadPlayerId)
    return { role, name: player?.firstName ?? null, jersey: player?.jersey ?? null, own: role === you }
  })
  return {
    title: light.title,
    when: light.when,
    lines: light.lines,
    unknown: light.unknown,
    keys: light.keys,
    foot: light.foot,
    way: {
      heading: `What we do: ${firstCall.name}`,
      steps: steps.map((index) => ({
        index,
        number: index + 1,
        title: firstCall.diagram.steps[index]?.title ?? '',
        solid: you,
      })),
    },
    five,
    looks: firstCall.looks.slice(0, 3),
    changeUp: changeUp && {
      heading: `On “${changeUp.call || changeUp.name}”`,
      text: mine?.changeUpRole ? (light.other?.line ?? '') : changeUp.name,
    },
    drawn: [
      ...textsOf(pressDrawing(content, { width: 640, labels: 'letters', medium: 'paper' }).nodes),
      ...steps.flatMap((step) =>
        textsOf(wayDrawing(content, { ...shown, step }, { width: 640, crop: 'full', medium: 'paper' }).nodes),
      ),
    ],
  }
}

/** Four steps at most: the first and the last, and between them those in which most roles decide. */
function stepsShown(counter: FrozenCounter, you: Role | null): number[] {
  const last = counter.diagram.steps.length - 1
  const weight = (index: number): number =>
    counter.roles.filter(({ keyStep, role }) => keyStep === index && (you === null || role === you)).length +
    (index === 0 || index === last ? 10 : 0)
  return counter.diagram.steps
    .map((_, index) => index)
    .sort((a, b) => weight(b) - weight(a) || a - b)
    .slice(0, FULLER_BUDGET.steps)
    .sort((a, b) => a - b)
}

/**
 * Words of a fuller page without names. Letters and numbers inside the drawings are counted as the light sheet
 * counts them, but a role's number once: five tokens of four drawings are read as places, not as words.
 */
export function fullerWords(page: FullerContent): number {
  const texts = [
    page.title,
    page.when,
    ...page.lines.flatMap(({ letter, lead, strong, count }) => [letter, lead + strong, count]),
    page.unknown ?? '',
    page.way.heading,
    ...page.way.steps.flatMap(({ number, title }) => [String(number), title]),
    ...page.five.map(({ role }) => role),
    ...page.looks,
    page.changeUp ? `${page.changeUp.heading} ${page.changeUp.text}` : '',
    ...page.keys,
    page.foot.sheet,
    page.foot.back,
    ...page.drawn.filter((text) => !/^\d$/.test(text)),
  ]
  return texts.reduce(
    (sum, text) => sum + text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length,
    0,
  )
}

/** Words of the fullest fuller page that a plan prints, against the limit. */
export function fullerBudgetOf(view: Omit<SheetView, 'budget'>): SheetView['budget'] {
  const readers = [null, ...view.players.map(({ squadPlayerId }) => squadPlayerId)]
  const copy = { copy: 10, copies: 10 }
  const words = Math.max(...readers.map((reader) => fullerWords(fullerContent(readBy(view, reader), copy))))
  return { words, limit: FULLER_BUDGET.words, over: words > FULLER_BUDGET.words }
}
