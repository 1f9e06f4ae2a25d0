import type { Box } from '@shared/court/path'
import { CAP_HEIGHT, DESCENT, textWidth } from '@shared/court/textWidth'
import type { GroupNode, PathNode, Scene, SceneNode, TextNode } from '@shared/court/scene'

/** Every node of a scene, groups and what is in them. */
export function allNodes(nodes: readonly SceneNode[]): SceneNode[] {
  return nodes.flatMap((node) => (node.kind === 'group' ? [node, ...allNodes(node.nodes)] : [node]))
}

export const groupsOf = (scene: Scene): GroupNode[] =>
  allNodes(scene.nodes).filter((node): node is GroupNode => node.kind === 'group')

export const groupOf = (scene: Scene, id: string): GroupNode | undefined =>
  groupsOf(scene).find((group) => group.id === id)

export const pathsOf = (nodes: readonly SceneNode[]): PathNode[] =>
  allNodes(nodes).filter((node): node is PathNode => node.kind === 'path')

export const textsOf = (nodes: readonly SceneNode[]): TextNode[] =>
  allNodes(nodes).filter((node): node is TextNode => node.kind === 'text')

/** The room that a line of type takes, metres. */
export function typeBox({ x, y, text, size, cut, anchor }: TextNode): Box {
  const width = textWidth(text, size, cut)
  const left = anchor === 'middle' ? x - width / 2 : anchor === 'end' ? x - width : x
  return { x: left, y: y - size * CAP_HEIGHT, width, height: size * (CAP_HEIGHT + DESCENT) }
}

/** The middle of a token: its disc is a circle drawn from its left edge to its right edge and back. */
export function discCentre(token: GroupNode): { x: number; y: number } {
  const disc = pathsOf(token.nodes).find((path) => path.stroke === 'our')
  const numbers = (disc?.d.match(/-?[\d.]+/g) ?? []).map(Number)
  const [left = NaN, y = NaN, r = NaN] = numbers
  return { x: left + r, y }
}

/** Path data that SVG and pdfkit both read: known letters, plain numbers. */
export const READABLE = /^[MLHVCAZhva\d.\s-]+$/
