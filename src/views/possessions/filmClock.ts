/** A place on the film, seconds from its start, as it is said and as it is typed. */

/** "31:07.4"; with hours from the first one on: "1:02:03". Tenths only where there are any. */
export function filmWords(seconds: number): string {
  const tenths = Math.round(seconds * 10)
  const whole = Math.floor(tenths / 10)
  const two = (value: number) => String(value).padStart(2, '0')
  const hours = Math.floor(whole / 3600)
  const minutes = Math.floor((whole % 3600) / 60)
  const head = hours === 0 ? String(minutes) : `${hours}:${two(minutes)}`
  return `${head}:${two(whole % 60)}${tenths % 10 === 0 ? '' : `.${tenths % 10}`}`
}

/** Reads "31:07.4", "1:02:03" or plain seconds, "1867.4"; null when it is none of them or past the longest film. */
export function readFilm(text: string, longest: number): number | null {
  const parts = /^(?:(?:(\d{1,2}):)?(\d{1,3}):)?(\d{1,5})(?:[.,](\d))?\d*$/.exec(text.trim())
  if (parts === null) return null
  const [hours, minutes, seconds, tenth] = [parts[1], parts[2], parts[3], parts[4]].map((part) =>
    Number(part ?? 0),
  )
  if (hours === undefined || minutes === undefined || seconds === undefined || tenth === undefined)
    return null
  if (parts[2] !== undefined && seconds > 59) return null
  if (parts[1] !== undefined && minutes > 59) return null
  const all = hours * 3600 + minutes * 60 + seconds + tenth / 10
  return all <= longest ? Math.round(all * 10) / 10 : null
}
