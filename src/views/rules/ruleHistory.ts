import type { ChangeRow } from '@shared/history/schemas'
import { Demand } from '@shared/rules/schemas'
import { STRENGTHS, TRAITS } from '@shared/counterWords'
import { labelOf } from '@shared/vocabulary'

/** What changed from what, as a correction is written: the old is struck, the new stands beside it. */
export interface Correction {
  /** Said before the two, e.g. "middle entry". */
  of: string
  from: string
  to: string
}

export interface HistoryLine {
  id: string
  at: string
  /** First name; "Somebody" once that person was erased. */
  who: string
  /** What was done, where there is nothing to strike. */
  words: string
  corrections: Correction[]
}

const demandsOf = (value: unknown): Demand[] => {
  const parsed = Demand.array().safeParse(value)
  return parsed.success ? parsed.data : []
}

/** Strengths by what they are asked of. */
function reweighed(from: unknown, to: unknown): Correction[] {
  const before = demandsOf(from)
  return demandsOf(to).flatMap((demand, index) => {
    const was = before[index]
    if (!('strength' in demand) || was === undefined || !('strength' in was)) return []
    if (was.strength === demand.strength) return []
    return [
      {
        of: labelOf(TRAITS, demand.trait),
        from: labelOf(STRENGTHS, was.strength),
        to: labelOf(STRENGTHS, demand.strength),
      },
    ]
  })
}

const onOff = (value: unknown): string => (value === true ? 'on' : 'off')

/** The entries of a rule's history in words, oldest first; what has no words is told as a change of what it asks. */
export function ruleHistory(rows: readonly ChangeRow[]): HistoryLine[] {
  return rows.map((row) => {
    const corrections = row.fields.flatMap(({ field, from, to }): Correction[] => {
      if (field === 'on') return [{ of: '', from: onOff(from), to: onOff(to) }]
      if (field === 'because') return [{ of: 'because', from: String(from), to: String(to) }]
      return field === 'then' ? reweighed(from, to) : []
    })
    const words = row.action === 'made' ? 'wrote it' : corrections.length === 0 ? 'changed what it asks' : ''
    return { id: row.id, at: row.at, who: row.who?.name.split(' ')[0] ?? 'Somebody', words, corrections }
  })
}
