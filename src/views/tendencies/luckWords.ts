import type { TendencyRead } from '@shared/tendencies/schemas'

/**
 * What chance alone would do to the claims in view (RECORD.md section 4, Luck). `inSituation`: a filter narrows
 * the rows, so that a habit needs ten rows over two games before it is called.
 */
export function luckWords(luck: TendencyRead['luck'], inSituation: boolean): string {
  const { inView, claimed, byChance } = luck
  if (inView === 0) return ''
  const chance = byChance < 0.5 ? 'less than one' : `about ${Math.round(byChance)}`
  const habits = inView === 1 ? '1 habit counted here' : `${inView} habits counted here`
  const said = claimed === 0 ? 'none comes out' : claimed === 1 ? '1 comes out' : `${claimed} come out`
  const bar = inSituation ? ' In one situation a habit needs 10 rows over two games before it is called.' : ''
  return `Luck: of ${habits} ${said} usually or rarely; if each were even, chance alone would give ${chance}.${bar}`
}
