/**
 * What a drawing is made of once it is worked out: shapes in metres, pens in metres, inks by name.
 * The screen turns a scene into SVG, the PDF into pdfkit calls; neither decides anything about the court.
 */
export type Ink =
  | 'graphite'
  | 'graphite-2'
  | 'graphite-3'
  | 'their'
  | 'our'
  | 'ball'
  | 'court-line'
  | 'axis'
  | 'floor'
  | 'sheet'
  | 'paper'

/** The face's cuts: width and weight together pick a font file on paper and axes on screen. */
export type Cut = 'label' | 'count' | 'text' | 'name'

export interface PathNode {
  kind: 'path'
  /** SVG path data; every number in metres. */
  d: string
  stroke?: Ink
  /** Metres. */
  strokeWidth?: number
  /** Metres, on and off in turn. */
  dash?: readonly number[]
  fill?: Ink
  /** 0 to 1; absent is 1. */
  fillOpacity?: number
  /** 0 to 1; absent is 1. */
  strokeOpacity?: number
  cap?: 'butt' | 'round'
  join?: 'miter' | 'round'
}

export interface TextNode {
  kind: 'text'
  x: number
  /** The baseline. */
  y: number
  text: string
  /** Font size in metres. */
  size: number
  cut: Cut
  weight: 500 | 600 | 700 | 800
  anchor: 'start' | 'middle' | 'end'
  ink: Ink
  /** A floor-coloured edge that keeps the text clear of hatch; metres wide. */
  halo?: { ink: Ink; width: number }
}

export interface GroupNode {
  kind: 'group'
  /** Stable name such as "trap-zones" or "token-1"; the screen uses it to point and to animate. */
  id: string
  /** What it is, for a screen reader; absent where the drawing's own description says it. */
  label?: string
  /** Metres: the point that stands for the group when it is chosen by key rather than by a tap. */
  at?: { readonly x: number; readonly y: number }
  nodes: SceneNode[]
}

export type SceneNode = PathNode | TextNode | GroupNode

export interface Scene {
  /** Metres: the part of the court and its margins that is to be shown. */
  view: { x: number; y: number; width: number; height: number }
  /** Bottom first. */
  nodes: SceneNode[]
  /** One or two sentences that say what the drawing shows. */
  description: string
}
