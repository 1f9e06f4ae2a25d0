import type { Turn } from '@shared/choices/schemas'
import { habitOf } from '@shared/tendencies/habits'

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1)

/** "they leave the middle open on the trap", "their safety leaves early". */
function doing(habitKey: string): string {
  const label = habitOf(habitKey)?.label ?? habitKey
  return label.startsWith('Safety ') ? `their ${lowerFirst(label)}` : `they ${lowerFirst(label)}`
}

/** What their next rows would have to show for the order to turn, as one sentence; `nameOf` names a counter. */
export function turnSentence(turn: Turn | undefined, leads: boolean, nameOf: (id: string) => string): string {
  if (turn === undefined)
    return leads
      ? 'Nothing in their next six would take it off first.'
      : 'Nothing seen so far would put it first.'
  const { habitKey, is, rows, of } = turn
  const often =
    is === 'more'
      ? `in ${rows} of the next ${of}`
      : rows === of
        ? `in none of the next ${of}`
        : `in only ${of - rows} of the next ${of}`
  const who = leads ? nameOf(turn.leads) : 'it'
  return `If ${doing(habitKey)} ${often}, ${who} would lead.`
}
