import { curveD, endOf, lengthOf, pointAt, straight } from '@shared/court/curve'
import { stepMoves, walkedWay } from '@shared/court/counterStep'
import type { DefenderId, Diagram } from '@shared/court/diagram'
import { startOfDiagram, stateAt, type Standing, type WalkedStep } from '@shared/court/diagramWalk'
import { moveWords } from '@shared/court/diagramWords'
import type { Held } from './hand'
import type { Station } from '@shared/court/edit/gestures'
import { toMetres, type InFractions, type InMetres } from '@shared/court/frame'
import { circleD } from '@shared/court/path'
import type { Pen } from '@shared/court/pen'
import { placeWords } from '@shared/court/placeWords'
import type { RulePack } from '@shared/court/rulePacks'
import type { SceneNode } from '@shared/court/scene'
import { ballAt, ghost, ourToken, theirToken, type TokenSize } from '@shared/court/tokens'
import type { Verdict } from '@shared/court/walk/laneWindow'
import { wordNode, wordPoint, wordSize } from '@shared/court/written'
import type { Role } from '@shared/vocabulary'

/** Something on the board that can be taken up. */
export interface Token {
  id: string
  held: Held
  at: InMetres
  /** What it is and where, for readers. */
  label: string
  node: SceneNode
  /** Half as wide and half as high as what is taken up, metres; a round one has none. */
  reach?: { x: number; y: number }
}

/** A drawn move as it can be pointed at. */
export interface MoveMark {
  index: number
  d: string
  label: string
  /** Where its end and its middle are taken up; null where there is nothing to take. */
  end: InMetres | null
  middle: InMetres | null
}

export interface Board {
  diagram: Diagram
  station: Station
  pack: RulePack
  pen: Pen
  size: TokenSize
}

export const standingOf = ({ diagram, station }: Pick<Board, 'diagram' | 'station'>): WalkedStep => {
  if (station !== 'start') return stateAt(diagram, station)
  const start = startOfDiagram(diagram)
  return { before: start, after: start, moves: [] }
}

/** The last step's places, faint, and everything that happens in this one. */
export function drawnNodes(board: Board, windows: ReadonlyMap<string, Verdict>): SceneNode[] {
  const { diagram, station, pack, pen, size } = board
  if (station === 'start') return []
  const { before } = stateAt(diagram, station)
  const last = station > 0 ? stateAt(diagram, station - 1).before : null
  const ghosts = [...(last?.ours ?? [])].flatMap(([role, place]) => {
    const now = before.ours.get(role)
    const [was, is] = [toMetres(pack, place), toMetres(pack, now ?? place)]
    return Math.hypot(was.x - is.x, was.y - is.y) < size.r ? [] : [ghost(was, size, pen)]
  })
  const { nodes } = stepMoves(diagram, station, { pack, pen, size, you: null, defenders: true, windows })
  return [
    { kind: 'group', id: 'ghosts', nodes: ghosts },
    { kind: 'group', id: 'moves', nodes },
  ]
}

/** All that can be taken up: words, ours, the ball, theirs, and whoever walks in this step at the end of the walk. */
export function tokensOf(board: Board): Token[] {
  const { station, pack, pen, size } = board
  const { before, after, moves } = standingOf(board)
  const metres = (place: InFractions): InMetres => toMetres(pack, place)
  const passes = moves.flatMap(({ move }) => (move.kind === 'pass' ? [move.from, move.to] : []))
  const onWay = new Set<Role>([before.ball, ...passes])
  const ours = [...before.ours].map(([role, place]): Token => ({
    id: `token-${role}`,
    held: { kind: 'player', who: role, again: false },
    at: metres(place),
    label: `${role}, at ${placeWords(place)}${role === after.ball ? ', has the ball' : ''}`,
    node: ourToken(metres(place), role, onWay.has(role), size, pen),
  }))
  const theirs = [...before.theirs].map(([id, place]): Token => ({
    id: `theirs-${id}`,
    held: { kind: 'player', who: id, again: false },
    at: metres(place),
    label: `${id} of theirs, at ${placeWords(place)}`,
    node: theirToken(metres(place), id, size, pen),
  }))
  return [
    ...wordsOf(board),
    ...ours,
    ...(station === 'start' ? [] : endsOf(before, after, board)),
    ...theirs,
    ...ballOf(after, board),
  ]
}

/** Words lie under the players: who stands on one is taken up first. */
function wordsOf({ diagram, station, pack, pen }: Board): Token[] {
  if (station === 'start') return []
  return (diagram.steps[station]?.words ?? []).map((word, index) => {
    const at = wordPoint(word, pack, pen)
    const { width, height } = wordSize(word.text, pen)
    return {
      id: `word-${index}`,
      held: { kind: 'word', index },
      at,
      label: `“${word.text}”, written at ${placeWords(word.at)}`,
      node: wordNode(word.text, at, pen),
      reach: { x: width / 2 + pen.px(8), y: Math.max(height / 2, pen.px(18)) },
    }
  })
}

function endsOf(before: Standing, after: Standing, { pack, pen, size }: Board): Token[] {
  const pairs: [Role | DefenderId, InFractions, InFractions | undefined][] = [
    ...[...after.ours].map(([role, at]): [Role, InFractions, InFractions | undefined] => [
      role,
      at,
      before.ours.get(role),
    ]),
  ]
  return pairs.flatMap(([who, place, was]) => {
    const [at, from] = [toMetres(pack, place), toMetres(pack, was ?? place)]
    if (Math.hypot(at.x - from.x, at.y - from.y) < size.r) return []
    const small = { ...size, r: size.r * 0.72 }
    const { nodes } = ourToken(at, who, false, small, pen)
    const ring = nodes.map((node) =>
      node.kind === 'path' && node.stroke
        ? { ...node, dash: [pen.px(3), pen.px(2)], fillOpacity: 0.7 }
        : node,
    )
    return [
      {
        id: `end-${who}`,
        held: { kind: 'player', who, again: true },
        at,
        label: `${who} after the move, at ${placeWords(place)}`,
        node: { kind: 'group', id: `end-${who}`, nodes: ring },
      },
    ]
  })
}

function ballOf(after: Standing, { pack, pen, size }: Board): Token[] {
  const place = after.ours.get(after.ball)
  if (!place) return []
  const holder = toMetres(pack, place)
  const at = { ...holder, x: holder.x + size.r * 0.58, y: holder.y - size.r * 1.08 } as InMetres
  return [
    {
      id: 'ball',
      held: { kind: 'ball' },
      at,
      label: `The ball, with ${after.ball}`,
      node: ballAt(holder, size, pen),
    },
  ]
}

/** The moves of a step as they can be pointed at. */
export function marksOf(board: Board): MoveMark[] {
  const { pack, station } = board
  if (station === 'start') return []
  return standingOf(board).moves.map(({ move, index, from, to }) => {
    const [a, b] = [toMetres(pack, from), toMetres(pack, to)]
    const bend = 'bend' in move ? move.bend : 0
    const way = move.kind === 'pass' ? straight(a, b) : walkedWay(pack, a, b, bend)
    return {
      index,
      d: curveD(way),
      label: moveWords(move),
      end: move.kind === 'pass' ? null : (endOf(way) as InMetres),
      middle: 'bend' in move ? (pointAt(way, lengthOf(way) / 2).point as InMetres) : null,
    }
  })
}

/** A handle on what is picked. */
export const handleD = (at: InMetres, pen: Pen, px: number): string => circleD(at, pen.px(px))
