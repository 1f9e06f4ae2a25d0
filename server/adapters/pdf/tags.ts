import type { Page } from './typeset'

/** An element of the structure tree that is still open. */
export type Tag = ReturnType<Page['struct']>

/** Draws as one element of the structure tree: what a reading voice will say. */
export function tagged(doc: Page, parent: Tag, type: string, draw: () => void, alt?: string): void {
  parent.add(doc.struct(type, alt === undefined ? {} : { alt }, draw))
}

/** Draws what no reading voice says: rules and ornament. */
export function artifact(doc: Page, draw: () => void): void {
  doc.markContent('Artifact', { type: 'Layout' })
  draw()
  doc.endMarkedContent()
}
