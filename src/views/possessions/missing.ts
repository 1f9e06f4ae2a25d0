import type { Line } from './line'
import { nextQuick, type QuickField } from './slots'

const WORDS: Record<QuickField, string> = {
  trigger: 'say what came before it',
  shape: 'say what they did',
  pickup: 'say how far up first',
  trap: 'say where they trapped first',
  outcome: 'say how it ended first',
}

/** What keeps a row from being saved, beside the save button; empty when nothing does. */
export function missingWords(line: Line): string {
  const next = nextQuick(line.draft, line.passed)
  return next === null ? '' : WORDS[next.field as QuickField]
}
