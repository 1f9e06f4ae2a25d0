import type { TendencyFilter } from '@shared/tendencies/schemas'

/** A condition and its parameters. */
export interface Where {
  sql: string
  parameters: (string | number)[]
}

const MARGIN_BANDS = {
  behind: 'p.margin <= -6',
  level: 'p.margin BETWEEN -5 AND 5',
  ahead: 'p.margin >= 6',
} as const

/** A column holds one of the values; null when nothing is asked of it. */
export const oneOf = (column: string, values: readonly (string | number)[] | undefined): Where | null =>
  values === undefined
    ? null
    : { sql: `${column} IN (${values.map(() => '?').join(', ') || 'NULL'})`, parameters: [...values] }

/** The situation filter over a possession `p` of a game `s`; true when nothing is filtered. */
export function situation(filter: TendencyFilter): Where {
  const margin = filter.margin?.map((band) => MARGIN_BANDS[band]).join(' OR ')
  const parts = [
    oneOf('p.trigger', filter.trigger),
    oneOf('p.period', filter.period),
    oneOf('p.pickup', filter.pickup),
    oneOf('p.shape', filter.shape),
    oneOf('s.id', filter.game),
    margin ? { sql: `(${margin})`, parameters: [] } : null,
  ].filter((part) => part !== null)
  return {
    sql: parts.map((part) => part.sql).join(' AND ') || '1',
    parameters: parts.flatMap((part) => part.parameters),
  }
}

/** True when the filter narrows to a situation: then a claim needs a lean (RECORD.md section 4, luck). */
export const narrows = (filter: TendencyFilter): boolean =>
  [filter.trigger, filter.period, filter.margin, filter.pickup, filter.shape].some(
    (list) => list !== undefined,
  )
