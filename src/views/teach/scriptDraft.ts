import { layReps } from '@shared/practices/script'
import type { RepsLogged, Script, ScriptLook } from '@shared/practices/schemas'
import { calendarDay, instantOf } from '@/composables/when'

/** A practice as it stands on the page; day and time are the team's own. */
export interface ScriptDraft {
  day: string
  time: string
  script: Script
  reps: RepsLogged[]
}

/** Usual hour of a practice (common practice, no source). */
const USUAL_TIME = '17:30'
const DAY_MS = 86_400_000

/** The evening before the game, where nothing was said. */
export function firstDraft(script: Script, tipOff: string, timeZone: string): ScriptDraft {
  const day = calendarDay(Date.parse(tipOff) - DAY_MS, timeZone)
  return { day, time: USUAL_TIME, script, reps: [] }
}

/** Wall clock of an instant in a zone, "17:30". */
export const timeOf = (instant: string, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).format(new Date(instant))

export const startOf = ({ day, time }: ScriptDraft, timeZone: string): string =>
  instantOf(day, time, timeZone)

/** "Thursday" */
export const weekdayOf = (day: string): string =>
  day === ''
    ? 'No day yet'
    : new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', weekday: 'long' }).format(
        new Date(`${day}T00:00:00Z`),
      )

/** "17:42", so many minutes after the start. */
export function clockAt(time: string, minutes: number): string {
  const [hours = 0, mins = 0] = time.split(':').map(Number)
  const all = Math.round(hours * 60 + mins + minutes)
  return `${String(Math.floor(all / 60) % 24).padStart(2, '0')}:${String(all % 60).padStart(2, '0')}`
}

/** A look with another number of reps; the number as shared out takes the correction away. */
export function withReps(script: Script, shape: ScriptLook['shape'], reps: number): Script {
  const changeUp = script.reps.some(({ call }) => call === 'changeUp')
  const looks = script.looks.map((look) =>
    look.shape === shape ? { ...look, changed: reps === look.proposed ? null : reps } : look,
  )
  return layReps({ ...script, looks, changeUp })
}

/** "2 walked, 4 five against six, 6 live; 2 on the other call" */
export function tickWords(script: Script, shape: ScriptLook['shape'], otherCall: string): string {
  const own = script.reps.filter((rep) => rep.shape === shape)
  const of = (kind: string) => own.filter((rep) => rep.kind === kind).length
  const other = own.filter(({ call }) => call === 'changeUp').length
  const parts = [
    [of('walk'), 'walked'],
    [of('overload'), 'five against six'],
    [of('live'), 'live'],
  ]
    .filter(([count]) => count !== 0)
    .map(([count, words]) => `${count} ${words}`)
  return `${parts.join(', ') || 'no reps'}${other > 0 ? `; ${other} on ${otherCall}` : ''}`
}

/** Minutes as a share of the whole practice, for CSS. */
export const shareOf = (script: Script, minutes: number): string => `${(100 * minutes) / script.minutes}%`

export const placeIn = (script: Script, { from, minutes }: { from: number; minutes: number }) => ({
  left: shareOf(script, from),
  width: shareOf(script, minutes),
})

/** Parts in which reps are run, with their place in the script and how many they hold. */
export const repPartsOf = (script: Script) =>
  script.parts
    .map((part, index) => ({
      ...part,
      index,
      count: script.reps.filter(({ kind }) => kind === part.kind).length,
    }))
    .filter(({ kind }) => kind === 'walk' || kind === 'overload' || kind === 'live')
