import type { Role } from '../vocabulary'
import { SHEET_BUDGET } from '../limits'
import { pressDrawing, textsOf, wayCrop, wayDrawing } from './drawings'
import { counterShown, wayShown, type WayShown } from './reader'
import type { FrozenCounter, FrozenPlan, SheetView } from './schemas'
import { sheetWhen } from './when'

export interface PressLine {
  letter: 'A' | 'B' | 'C'
  /** "They trap " */
  lead: string
  /** "in the corner." */
  strong: string
  /** "7 of 11" */
  count: string
  ink: 'their' | 'our'
}

/** Whom the sheet speaks to: one player of a role, or everybody with the five of the first call. */
export type SheetReader =
  | { kind: 'one'; name: string; role: Role; rest: string; jobs: string[] }
  | { kind: 'five'; heading: string; rows: { role: Role; name: string | null; job: string }[] }

/** Everything that stands on the one page, for one reader. Players' names have fields of their own. */
export interface SheetContent {
  title: string
  when: string
  lines: PressLine[]
  /** Stands instead of the lines when nothing was counted. */
  unknown: string | null
  way: WayShown & { heading: string }
  reader: SheetReader
  /** The other call in one line: "On “Box”:" and what the reader does then. */
  other: { lead: string; line: string } | null
  keys: string[]
  foot: { sheet: string; owner: { name: string; jersey: number } | null; back: string }
  /** Letters, numbers and words inside the two drawings. */
  drawn: string[]
}

export interface Copy {
  /** Number of this copy and how many there are. */
  copy?: number
  copies?: number
}

/** What stands on the page for the reader that the view names (`mine`), or for everybody. */
export function sheetContent(view: Omit<SheetView, 'budget'>, copy: Copy = {}): SheetContent {
  const { content, mine } = view
  const way = wayShown(content, mine)
  const player = mine && view.players.find(({ squadPlayerId }) => squadPlayerId === mine.squadPlayerId)
  const reader = readerOf(view, way, player?.firstName ?? '')
  return {
    title: content.opponentName,
    when: sheetWhen(content.tipOff, view.timeZone, content.place),
    lines: content.press.lines.slice(0, SHEET_BUDGET.points).map(({ letter, text, k, n, ink }) => ({
      letter,
      ...emphasised(text),
      count: `${k} of ${n}`,
      ink,
    })),
    unknown: content.press.lines.length === 0 ? 'We do not know their press yet.' : null,
    way: {
      ...way,
      heading: `${way.counter === 'firstCall' ? 'First call' : 'Change-up'}${named(counterShown(content, way))}`,
    },
    reader,
    other: way.counter === 'changeUp' ? firstCallLine(content) : changeUpLine(content, mine),
    keys: content.keys,
    foot: {
      sheet: sheetNumber(view.planNumber, copy),
      owner: player ? { name: player.firstName, jersey: player.jersey } : null,
      back: 'Bring it back.',
    },
    drawn: [
      ...textsOf(pressDrawing(content, { width: NOMINAL, labels: 'letters', medium: 'paper' }).nodes),
      ...textsOf(
        wayDrawing(content, way, { width: NOMINAL, crop: wayCrop(content, way), medium: 'paper' }).nodes,
      ),
    ],
  }
}

/** Width at which drawings are read for their words: wide enough that no token loses its number. */
const NOMINAL = 640

function readerOf(view: Omit<SheetView, 'budget'>, way: WayShown, name: string): SheetReader {
  const { content } = view
  const counter = counterShown(content, way)
  const own = counter.roles.find(({ role }) => role === way.you)
  if (way.you !== null && own) {
    const on = way.counter === 'changeUp' ? ` on “${counter.call}”` : ''
    return { kind: 'one', name, role: way.you, rest: `you are ${way.you}${on}.`, jobs: own.jobs.slice(0, 4) }
  }
  return {
    kind: 'five',
    heading: 'The five',
    rows: content.firstCall.roles.map(({ role, jobs, squadPlayerId }) => ({
      role,
      name: view.players.find((one) => one.squadPlayerId === squadPlayerId)?.firstName ?? null,
      job: jobs[0] ?? '',
    })),
  }
}

/** ": Box, big in the middle", with the word that is called where the name does not begin with it. */
function named({ name, call }: FrozenCounter): string {
  const said = call === '' || name.toLowerCase().startsWith(call.toLowerCase())
  return said ? `: ${name}` : ` “${call}”: ${name}`
}

/** The line of the change-up for a reader: her own, or what it is for whoever has no part in it. */
function changeUpLine({ changeUp }: FrozenPlan, mine: SheetView['mine']): SheetContent['other'] {
  if (!changeUp) return null
  const call = `On “${changeUp.call || changeUp.name}”`
  const lineOf = (role: Role) => changeUp.roles.find((one) => one.role === role)?.changeUpLine ?? ''
  if (mine?.changeUpRole) {
    const moved = mine.firstCallRole !== null && mine.firstCallRole !== mine.changeUpRole
    const lead = moved ? `${call} you are ${mine.changeUpRole}:` : `${call}:`
    return { lead, line: uncapitalised(lineOf(mine.changeUpRole)) }
  }
  const someKnown = changeUp.roles.some(({ squadPlayerId }) => squadPlayerId !== null)
  if (mine?.firstCallRole && someKnown) return { lead: `${call}:`, line: 'you come off.' }
  return { lead: `${call}:`, line: `${afterCall(changeUp)}.` }
}

/** "big in the middle" of "Box, big in the middle"; a name that does not begin so stays whole. */
function afterCall({ name, call }: FrozenCounter): string {
  const begins = call !== '' && name.toLowerCase().startsWith(`${call.toLowerCase()}, `)
  return begins ? name.slice(call.length + 2) : name
}

const firstCallLine = ({ firstCall }: FrozenPlan): SheetContent['other'] => ({
  lead: 'First call:',
  line: `${firstCall.name}, without you.`,
})

function sheetNumber(plan: number, { copy, copies }: Copy): string {
  if (copy === undefined) return `Sheet, plan ${plan}.`
  return `Sheet ${copy}${copies === undefined ? '' : ` of ${copies}`}, plan ${plan}.`
}

/** "They trap" and then what matters: where, or what is left. */
function emphasised(text: string): { lead: string; strong: string } {
  const lead = /^(They \w+(?: again| up)?(?: the first pass)?) (?=\S)/.exec(text)?.[0] ?? ''
  return { lead, strong: text.slice(lead.length) }
}

const uncapitalised = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1)
