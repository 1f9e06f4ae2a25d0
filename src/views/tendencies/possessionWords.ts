import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import type { PossessionRow } from '@shared/possessions/schemas'
import { spotPhrase } from '@shared/tendencies/habits'
import {
  DENIED,
  labelOf,
  LANES,
  NOT_VISIBLE,
  OUTCOME_PLACES,
  OUTCOMES,
  PICKUPS,
  SHAPE_VARIANTS,
  SHAPES,
  TRAP_CUES,
  TRAP_RESULTS,
  TRIGGERS,
} from '@shared/vocabulary'
import { shortDay } from '@/composables/when'
import { capital, listed, our, plain, their, type Segment } from './segments'

/** One logged possession as the sentence it was logged in: theirs in their ink, the room in ours. */
export function possessionWords(row: PossessionRow): Segment[] {
  const segments: Segment[] = [
    plain(`${row.trigger === 'live' ? 'On a' : 'After a'} ${labelOf(TRIGGERS, row.trigger)} they `),
    ...shapeWords(row),
    ...deniedWords(row),
    ...trapWords(row),
    plain('.'),
  ]
  if (Array.isArray(row.leftOpen) && row.leftOpen.length > 0) {
    const names = listed(row.leftOpen.map((lane) => labelOf(LANES, lane)))
    segments.push(
      plain(' '),
      our(`${capital(names)} ${row.leftOpen.length > 1 ? 'were' : 'was'} open`),
      plain('.'),
    )
  }
  return [...segments, ...outcomeWords(row)]
}

function shapeWords({ shape, shapeVariant, pickup }: PossessionRow): Segment[] {
  if (shape === null) return [plain('came in a shape that was not logged')]
  if (shape === 'fake' || shape === 'dropped-back') return [their(labelOf(SHAPES, shape))]
  const at = pickup !== null && pickup !== NOT_VISIBLE ? ` ${labelOf(PICKUPS, pickup)}` : ''
  const variant = shapeVariant === null ? '' : `, ${labelOf(SHAPE_VARIANTS, shapeVariant)}`
  const name =
    shape === 'person' ? 'person to person' : shape === 'other-zone' ? 'in another zone' : `in a ${shape}`
  return [their(`pressed${at} ${name}${variant}`)]
}

function deniedWords({ denied }: PossessionRow): Segment[] {
  if (!Array.isArray(denied) || denied.length === 0) return []
  return [plain(', '), their(`denied ${listed(denied.map((lane) => labelOf(DENIED, lane)))}`)]
}

function trapWords({ traps }: PossessionRow): Segment[] {
  if (!Array.isArray(traps)) return []
  return traps.flatMap((trap, index): Segment[] => {
    const place = spotPhrase(trap.spot, trap.side)
    const cue = trap.cue !== null && trap.cue !== NOT_VISIBLE ? ` ${labelOf(TRAP_CUES, trap.cue)}` : ''
    const t = trap.t === null ? '' : ` at ${trap.t.toFixed(1)} s`
    const result =
      trap.result !== null && trap.result !== NOT_VISIBLE ? ` (${labelOf(TRAP_RESULTS, trap.result)})` : ''
    return [
      plain(index === 0 ? ', ' : ', then '),
      their(`trapped ${index === 0 ? '' : 'again '}${place}${cue}${t}`),
      plain(result),
    ]
  })
}

function outcomeWords({ outcome, outcomePlace }: PossessionRow): Segment[] {
  if (outcome === null) return []
  const place =
    outcomePlace !== null && outcomePlace !== NOT_VISIBLE ? ` ${labelOf(OUTCOME_PLACES, outcomePlace)}` : ''
  return [plain(` ${capital(labelOf(OUTCOMES, outcome))}${place}.`)]
}

/** "Q2 6:44", from tenths of a second left; the parts that were logged, or nothing. */
export function clockWords(
  { period, clock }: Pick<PossessionRow, 'period' | 'clock'>,
  pack: RulePack,
): string {
  const whole = clock === null ? null : Math.floor(clock / 10)
  const time = whole === null ? '' : `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`
  return [period === null ? '' : periodLabel(pack, period), time].filter(Boolean).join(' ')
}

/** The pressing team's lead as it stands in a line of facts: "they led by 3"; empty when not logged. */
export function leadWords(margin: number | null): string {
  if (margin === null) return ''
  if (margin === 0) return 'level'
  return margin > 0 ? `they led by ${margin}` : `they trailed by ${-margin}`
}

/** The label of a game with its calendar day, "v Tarn Valley, 2026-03-14", with the day as coaches say it. */
export const gameWords = (label: string): string =>
  label.replace(/\d{4}-\d{2}-\d{2}/, (date) => shortDay(date))

/** Where and when it was: "v Tarn Valley, Sat 14 Mar, Q2 6:44, they trailed by 3". */
export const whereWords = (row: PossessionRow, gameLabel: string, pack: RulePack): string =>
  [gameWords(gameLabel), clockWords(row, pack), leadWords(row.margin)].filter(Boolean).join(', ')
