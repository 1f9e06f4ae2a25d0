import type { FrozenPlan } from './schemas'

const PLACES: Record<FrozenPlan['place'], string> = {
  home: 'at home',
  away: 'away',
  neutral: 'on neutral floor',
}

/** "Friday 20 March, 19:15, at home", in the team's zone; day names and order are ours. */
export function sheetWhen(tipOff: string, timeZone: string, place: FrozenPlan['place']): string {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  })
  const found = new Map(format.formatToParts(new Date(tipOff)).map((part) => [part.type, part.value]))
  const of = (type: Intl.DateTimeFormatPartTypes) => found.get(type) ?? ''
  return `${of('weekday')} ${of('day')} ${of('month')}, ${of('hour')}:${of('minute')}, ${PLACES[place]}`
}
