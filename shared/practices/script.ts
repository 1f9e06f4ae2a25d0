import { labelOf, SHAPES, type Shape } from '../vocabulary'
import type { Caution, PartKind, RepKind, Script, ScriptLook, ScriptPart, ScriptRep } from './schemas'

/** Settings of a script (common practice, no source). */
export const SCRIPT_SETTINGS = {
  /** Share of the time; what rounding leaves goes to the live part. */
  shares: { talk: 0.075, walk: 0.2, overload: 0.275, drink: 0.05, close: 0.05 },
  /** Reps a minute. */
  pace: { walk: 0.75, overload: 0.9, live: 1.15 },
  /** Most reps of a part, however long it is: live and overloaded ones tire. */
  most: { walk: 12, overload: 12, live: 20 },
  /** No look that is taught gets fewer. */
  leastOfALook: 2,
  /** One rep in so many of a look is the other call. */
  otherCallEvery: 5,
  /** Looks shown; the rest are too rare to teach. */
  looks: 4,
} as const

export interface ScriptFacts {
  minutes: number
  /** Counted throw-ins by shape, dropped back and fakes among them. */
  looks: readonly { shape: Shape; k: number }[]
  /** A change-up was picked. */
  changeUp: boolean
  /** Steps with a blind screen in what is taught, counted from 1. */
  blindScreens: readonly { counter: string; step: number }[]
  /** First names of players of the squad who are out that day. */
  out: readonly string[]
  /** First names of players who are just back. */
  shortTurns: readonly string[]
}

/**
 * The script of one practice: parts that get harder, reps shared out by how often each look came, walked ones
 * first, no look three times running where that can be helped, and the cautions at the minute they matter.
 */
export function proposeScript(facts: ScriptFacts): Script {
  const parts = partsOf(facts.minutes)
  const looks = shareOut(facts.looks, repsOf(parts))
  return layReps({
    minutes: facts.minutes,
    parts,
    looks,
    changeUp: facts.changeUp,
    cautions: cautionsOf(facts, parts),
  })
}

/** Lays the ticks anew, after a look's reps or a part's minutes were changed by hand. */
export function layReps({ changeUp, ...script }: Omit<Script, 'reps'> & { changeUp: boolean }): Script {
  const order = interleave(
    script.looks.map(({ shape, proposed, changed }) => ({ shape, reps: changed ?? proposed })),
  )
  return { ...script, reps: ticks(order, script.parts, changeUp) }
}

/** Talk, walk, five against six, a drink, live, talk: whole minutes that add up. */
function partsOf(minutes: number): ScriptPart[] {
  const { shares } = SCRIPT_SETTINGS
  const of = (share: number) => Math.max(1, Math.round(minutes * share))
  const [talk, walk, overload, drink, close] = [
    of(shares.talk),
    of(shares.walk),
    of(shares.overload),
    of(shares.drink),
    of(shares.close),
  ]
  const live = Math.max(1, minutes - talk - walk - overload - drink - close)
  const lengths: [PartKind, number][] = [
    ['talk', talk],
    ['walk', walk],
    ['overload', overload],
    ['drink', drink],
    ['live', live],
    ['talk', close],
  ]
  let from = 0
  return lengths.map(([kind, length]) => {
    const part = { kind, from, minutes: length, leader: '' }
    from += length
    return part
  })
}

const isRep = (kind: PartKind): kind is RepKind => kind === 'walk' || kind === 'overload' || kind === 'live'

function countOf({ kind, minutes }: ScriptPart): number {
  if (!isRep(kind)) return 0
  return Math.min(SCRIPT_SETTINGS.most[kind], Math.round(minutes * SCRIPT_SETTINGS.pace[kind]))
}

const repsOf = (parts: readonly ScriptPart[]): number => parts.reduce((sum, part) => sum + countOf(part), 0)

/**
 * Reps of each look: its share of all throw-ins, rounded, none under two. What rounding adds or leaves is taken
 * from, or given to, the look whose share it changes least.
 */
export function shareOut(looks: readonly { shape: Shape; k: number }[], total: number): ScriptLook[] {
  const shown = looks
    .filter(({ k }) => k > 0)
    .sort((a, b) => b.k - a.k)
    .slice(0, SCRIPT_SETTINGS.looks)
  const n = looks.reduce((sum, { k }) => sum + k, 0)
  const taught = shown.reduce((sum, { k }) => sum + k, 0)
  const least = SCRIPT_SETTINGS.leastOfALook
  const reps = shown.map(({ k }) => Math.max(least, Math.round((total * k) / taught)))
  const wanted = Math.max(total, least * shown.length)
  for (let sum = reps.reduce((a, b) => a + b, 0); sum !== wanted && shown.length > 0;) {
    const step = sum > wanted ? -1 : 1
    const off = (at: number) => ((reps[at] ?? 0) - (total * (shown[at]?.k ?? 0)) / taught) * step
    const [best] = shown
      .map((_, at) => at)
      .filter((at) => step > 0 || (reps[at] ?? 0) > least)
      .sort((a, b) => off(a) - off(b))
    if (best === undefined) break
    reps[best] = (reps[best] ?? 0) + step
    sum += step
  }
  return shown.map(({ shape, k }, at) => ({ shape, k, n, proposed: reps[at] ?? 0, changed: null }))
}

/** Looks in turn by their shares; none comes three times running where another is left to go between. */
export function interleave(looks: readonly { shape: Shape; reps: number }[]): Shape[] {
  const total = looks.reduce((sum, { reps }) => sum + reps, 0)
  const left = new Map(looks.map(({ shape, reps }) => [shape, reps]))
  const order: Shape[] = []
  while (order.length < total) {
    const open = looks.filter(({ shape }) => (left.get(shape) ?? 0) > 0)
    const twice = order.at(-1) !== undefined && order.at(-1) === order.at(-2) ? order.at(-1) : undefined
    const free = open.filter(({ shape }) => shape !== twice)
    const next = pick(free.length > 0 ? free : open, left, order.length, total)
    if (next === undefined) break
    left.set(next, (left.get(next) ?? 0) - 1)
    order.push(next)
  }
  return order
}

/** Whoever is furthest behind its share; one that must come now, or would run together at the end, goes first. */
function pick(
  open: readonly { shape: Shape; reps: number }[],
  left: ReadonlyMap<Shape, number>,
  placed: number,
  total: number,
): Shape | undefined {
  const remaining = [...left.values()].reduce((sum, reps) => sum + reps, 0)
  const pressing = open.find(({ shape }) => {
    const own = left.get(shape) ?? 0
    return own > 2 * (remaining - own)
  })
  if (pressing) return pressing.shape
  const behind = ({ shape, reps }: { shape: Shape; reps: number }) =>
    (reps * (placed + 1)) / total - (reps - (left.get(shape) ?? 0))
  return [...open].sort((a, b) => behind(b) - behind(a))[0]?.shape
}

/** The order laid over the parts: each part takes its own number, evenly through its minutes. */
function ticks(order: readonly Shape[], parts: readonly ScriptPart[], changeUp: boolean): ScriptRep[] {
  const active = parts.filter(({ kind }) => isRep(kind))
  const planned = repsOf(active)
  const reps: ScriptRep[] = []
  const runOf = new Map<Shape, number>()
  /** Counted look by look: in one count over all, looks that take turns could leave it to the same one. */
  const callOf = (shape: Shape): ScriptRep['call'] => {
    const run = (runOf.get(shape) ?? 0) + 1
    runOf.set(shape, run)
    const { otherCallEvery } = SCRIPT_SETTINGS
    return changeUp && run % otherCallEvery === Math.ceil(otherCallEvery / 2) ? 'changeUp' : 'firstCall'
  }
  let done = 0
  let plannedSoFar = 0
  active.forEach((part) => {
    plannedSoFar += countOf(part)
    const until = planned === 0 ? 0 : Math.round((order.length * plannedSoFar) / planned)
    const own = order.slice(done, until)
    own.forEach((shape, at) =>
      reps.push({
        at: Math.round((part.from + ((at + 0.5) * part.minutes) / own.length) * 10) / 10,
        shape,
        kind: isRep(part.kind) ? part.kind : 'walk',
        call: callOf(shape),
      }),
    )
    done = until
  })
  return reps
}

/**
 * Cautions from two sources only: blind screens in the drawing, and people on short turns or out. Where they
 * matter: a screen when it is first walked, tired legs when it goes live (DOMAIN.md section 6).
 */
function cautionsOf(facts: ScriptFacts, parts: readonly ScriptPart[]): Caution[] {
  const startOf = (kind: PartKind) => parts.find((part) => part.kind === kind)?.from ?? 0
  const [blind] = facts.blindScreens
  const live = startOf('live')
  return [
    ...(blind
      ? [
          {
            at: startOf('walk'),
            title: `Blind screen, step ${blind.step}.`,
            text: `In ${blind.counter} the screened player cannot see it. Leave her a step, call it, stand still. Walk it until nobody is hit.`,
          },
          {
            at: live,
            title: 'Tired legs.',
            text: 'No blind screens in tired reps. Stop at once for any contact with a head.',
          },
        ]
      : []),
    ...(facts.out.length > 0
      ? [
          {
            at: startOf('walk'),
            title: facts.out.length === 1 ? 'One is out.' : `${facts.out.length} are out.`,
            text: `${listed(facts.out)} ${facts.out.length === 1 ? 'does' : 'do'} not take part. Fill the place before you walk it.`,
          },
        ]
      : []),
    ...(facts.shortTurns.length > 0
      ? [
          {
            at: live,
            title: 'Short turns.',
            text: `${listed(facts.shortTurns)} ${facts.shortTurns.length === 1 ? 'is' : 'are'} just back. Change ${facts.shortTurns.length === 1 ? 'her' : 'them'} early.`,
          },
        ]
      : []),
  ]
}

/** "Ada, Nell and Wren" */
export function listed(names: readonly string[]): string {
  const last = names.at(-1) ?? ''
  return names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`
}

/** What a look is called beside its count. */
export function lookName(shape: Shape): string {
  const label = labelOf(SHAPES, shape)
  return label.charAt(0).toUpperCase() + label.slice(1)
}
