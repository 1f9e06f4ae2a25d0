import { counterScale, counterScene, type CounterSceneOptions } from '../court/counterScene'
import type { HatchMedium } from '../court/hatch'
import { pressScale, pressScene } from '../court/pressScene'
import type { Counted, PressSceneOptions } from '../court/pressOptions'
import { rulePack } from '../court/rulePacks'
import type { Scene, SceneNode } from '../court/scene'
import { shapeSpots } from '../court/shapeSpots'
import type { TrapZone } from '../court/trapZones'
import type { Crop } from '../court/view'
import { SHAPES, SHAPE_VARIANTS } from '../vocabulary'
import { counterShown, type WayShown } from './reader'
import type { FrozenCounter, FrozenPlan } from './schemas'

interface Look {
  /** CSS px; on paper points times 4/3. */
  width: number
  medium?: HatchMedium
  crop?: Crop
}

/** CSS px: a narrower drawing has no room for the sheet's large letters. */
const LARGE_LETTERS_FROM = 460

/** Their press on the long court: the same scene for paper, the coach's preview and the phone. */
export function pressDrawing(
  content: FrozenPlan,
  { width, medium, crop, labels }: Look & { labels: 'letters' | 'counts' },
): Scene {
  const { press } = content
  const options: Omit<PressSceneOptions, 'pxPerMetre'> = {
    pack: rulePack(content.rulePack),
    zones: zonesOf(content, labels === 'letters'),
    pickup: press.pickup && { ...countOf(content, 'pickup:'), at: press.pickup, thin: press.pickupThin },
    room: press.room && { ...countOf(content, `leave-open:${press.room}`), lane: press.room },
    defenders: standing(content),
    thrower: throwerOf(content.firstCall),
    ballSide: ballSide(content.firstCall),
    labels,
    medium,
    crop,
    type: labels === 'letters' ? (width < LARGE_LETTERS_FROM ? 0.8 : 1.2) : 1,
  }
  const scene = pressScene({ ...options, pxPerMetre: pressScale(options, width) })
  const bare = [
    ...(options.pickup && options.pickup.n === 0 ? ['label-pickup'] : []),
    ...(options.room && options.room.n === 0 ? ['label-room'] : []),
  ]
  return { ...scene, nodes: without(scene.nodes, bare), description: pressWords(content) }
}

/** A step of our way, or all of it, over their traps. */
export function wayDrawing(
  content: FrozenPlan,
  shown: Omit<WayShown, 'step'> & { step: number | 'all' },
  { width, medium, crop }: Look,
): Scene {
  const counter = counterShown(content, shown)
  const options: Omit<CounterSceneOptions, 'pxPerMetre'> = {
    diagram: counter.diagram,
    pack: rulePack(content.rulePack),
    step: shown.step,
    you: shown.you,
    zones: zonesOf(content),
    room: content.press.room && { lane: content.press.room, ballSide: ballSide(counter) },
    medium,
    crop,
    small: false,
  }
  return counterScene({ ...options, pxPerMetre: counterScale(options, width) })
}

/** How far a drawing of one step must reach: to just past half, or all of it when somebody goes further. */
export function wayCrop(content: FrozenPlan, shown: WayShown): Crop {
  const { diagram } = counterShown(content, shown)
  const far = diagram.steps
    .slice(0, shown.step + 1)
    .some((step) =>
      step.moves.some(
        (move) => 'to' in move && typeof move.to === 'object' && move.kind !== 'theirs' && move.to.x > 0.54,
      ),
    )
  return far ? 'full' : 'half'
}

/** What the press drawing says, in the words and letters of the page. */
export function pressWords(content: FrozenPlan): string {
  const said = content.press.lines.map(({ letter, text, k, n }) => `${letter}: ${text} ${k} of ${n}.`)
  return ['Their press on the long court.', ...said].join(' ')
}

const zonesOf = ({ press }: FrozenPlan, lettered = false): TrapZone[] =>
  press.zones.map(({ spot, side, k, n, thin, letter }) => ({
    spot,
    side,
    k,
    n,
    thin,
    ...(lettered && letter !== null ? { letter } : {}),
  }))

/** The count and the letter of the line that speaks of a mark; 0 of 0 where no line does. */
function countOf({ press }: FrozenPlan, habit: string): Counted {
  const line = press.lines.find(({ habitKey }) => habitKey.startsWith(habit))
  return line ? { k: line.k, n: line.n, thin: false, letter: line.letter } : { k: 0, n: 0, thin: false }
}

/** Five stand in every drawing: by their shape, else as the first call is drawn against. */
function standing(content: FrozenPlan): { x: number; y: number }[] {
  const shape = [...SHAPES, ...SHAPE_VARIANTS].find(({ value }) => value === content.press.mostlyShape)
  const spots = shape ? shapeSpots(shape.value, ballSide(content.firstCall)) : []
  return spots.length > 0 ? spots : content.firstCall.diagram.start.theirs.map(({ at }) => at)
}

function throwerOf({ diagram }: FrozenCounter): PressSceneOptions['thrower'] {
  const thrower = diagram.start.ours.find(({ role }) => role === diagram.start.ball)
  return thrower && thrower.at.x < 0 ? thrower : null
}

/** Where the ball comes in, so that both drawings of a page agree. */
function ballSide({ diagram }: FrozenCounter): 'left' | 'right' {
  const thrower = diagram.start.ours.find(({ role }) => role === diagram.start.ball)
  return thrower && thrower.at.y < 0.5 ? 'left' : 'right'
}

function without(nodes: readonly SceneNode[], ids: readonly string[]): SceneNode[] {
  if (ids.length === 0) return [...nodes]
  return nodes
    .filter((node) => node.kind !== 'group' || !ids.includes(node.id))
    .map((node) => (node.kind === 'group' ? { ...node, nodes: without(node.nodes, ids) } : node))
}

/** Every piece of text that a drawing shows. */
export const textsOf = (nodes: readonly SceneNode[]): string[] =>
  nodes.flatMap((node) =>
    node.kind === 'text' ? [node.text] : node.kind === 'group' ? textsOf(node.nodes) : [],
  )
