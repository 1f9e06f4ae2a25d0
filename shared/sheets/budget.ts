import { SHEET_BUDGET } from '../limits'
import { sheetContent, type SheetContent } from './content'
import { readBy } from './reader'
import type { SheetView } from './schemas'

/** Every text of a page but the names of our players. */
function textsWithoutNames(page: SheetContent): string[] {
  const { reader, foot } = page
  return [
    page.title,
    page.when,
    ...page.lines.flatMap(({ letter, lead, strong, count }) => [letter, lead + strong, count]),
    page.unknown ?? '',
    page.way.heading,
    ...(reader.kind === 'one'
      ? [reader.role, reader.rest, ...reader.jobs]
      : [reader.heading, ...reader.rows.flatMap(({ role, job }) => [role, job])]),
    page.other ? `${page.other.lead} ${page.other.line}` : '',
    ...page.keys,
    foot.sheet,
    foot.owner ? String(foot.owner.jersey) : '',
    foot.back,
    ...page.drawn,
  ]
}

/**
 * Words on a page, as a reader meets them: everything between spaces that has a letter or a figure, in
 * sentences, counts and drawings alike. Names of our players are left out (design section 4).
 */
export const sheetWords = (page: SheetContent): number =>
  textsWithoutNames(page).reduce(
    (sum, text) => sum + text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length,
    0,
  )

/** Copy numbers as they may be printed, so that the count holds for the fullest foot. */
const COPY = { copy: 10, copies: 10 }

/** Words of the fullest page that a plan prints, the general one or a player's, against the limit. */
export function budgetOf(view: Omit<SheetView, 'budget'>): { words: number; limit: number; over: boolean } {
  const readers = [null, ...view.players.map(({ squadPlayerId }) => squadPlayerId)]
  const words = Math.max(...readers.map((reader) => sheetWords(sheetContent(readBy(view, reader), COPY))))
  return { words, limit: SHEET_BUDGET.words, over: words > SHEET_BUDGET.words }
}
