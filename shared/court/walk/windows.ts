import type { Role } from '../../vocabulary'
import { laneWindow, type LaneWindow, type Threat, type Verdict } from './laneWindow'
import type { Flight } from './passFlight'
import type { WalkSettings } from './settings'
import { standingAt } from './standing'
import type { BallFlight, Timeline } from './timeline'

/** A pass of a diagram and whether it is on as drawn. */
export interface PassWindow extends LaneWindow {
  step: number
  /** Index in the step's list. */
  move: number
  by: Role
  to: Role
  flight: Flight
  throwIn: boolean
  /** When it is let go, seconds on the timeline. */
  start: number
  /** Metres. */
  length: number
  /** In the air. */
  seconds: number
  /** How high a lob gets, metres; null for any other pass. */
  top: number | null
  /** "On when X3 is two strides behind; as drawn, one." */
  words: string
}

/** Every pass in order, each against where theirs stand when it is let go. */
export function passWindows(timeline: Timeline): PassWindow[] {
  return timeline.flights.flatMap((flight) => {
    const timed = timeline.moves.find(({ step, index }) => step === flight.step && index === flight.index)
    if (timed?.move.kind !== 'pass') return []
    const window = windowOf(timeline, flight)
    return [
      {
        ...window,
        step: flight.step,
        move: flight.index,
        by: flight.by,
        to: flight.to,
        flight: timed.move.flight,
        throwIn: timed.move.throwIn,
        start: flight.start,
        length: timed.length,
        seconds: flight.end - flight.start,
        top: flight.top,
        words: windowWords(window, timeline.settings),
      },
    ]
  })
}

function windowOf(timeline: Timeline, { start, end, from, at, heightAt }: BallFlight): LaneWindow {
  const theirs = [...standingAt(timeline, start).theirs].map(([id, place]) => ({ id, at: place }))
  return laneWindow({ from, at, flight: { seconds: end - start, heightAt } }, theirs, timeline.settings)
}

/** The passes' verdicts by move, as counterScene's `windows` takes them: "step-move" to verdict. */
export const verdictsOf = (windows: readonly PassWindow[]): ReadonlyMap<string, Verdict> =>
  new Map(windows.map(({ step, move, verdict }) => [`${step}-${move}`, verdict]))

/** When a pass is on, in plain words. */
export function windowWords({ verdict, threat }: LaneWindow, { stride }: WalkSettings): string {
  if (!threat) return 'Open: none of theirs stands near.'
  const needs = Math.max(1, Math.ceil(threat.needs / stride - 1e-9))
  const has = Math.floor(threat.has / stride + 1e-9)
  if (verdict === 'open')
    return has >= needs
      ? `Open: on while ${threat.id} is ${strides(needs)} ${side(threat)}.`
      : `Open, with less than a stride to spare from ${threat.id}.`
  const on = `On when ${threat.id} is ${strides(needs)} ${side(threat)}; as drawn, ${has === 0 ? 'less than one' : word(has)}.`
  if (verdict === 'tight') return on
  return threat.has <= 0.5 * stride && threat.where === 'lane'
    ? `Closed: ${threat.id} stands in the way.`
    : `Closed. ${on}`
}

const side = ({ where }: Threat): string => (where === 'catch' ? 'behind' : 'off the lane')

const WORDS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
]
const word = (count: number): string => WORDS[count] ?? String(count)
const strides = (count: number): string => `${word(count)} ${count === 1 ? 'stride' : 'strides'}`
