import { LIMITS, STILL_TYPES } from '@shared/limits'

/** The `accept` of a file field. */
export const PICTURE_TYPES = STILL_TYPES.join(',')

const MB = 1024 * 1024

/** Why a picture cannot be taken, in words with the remedy; null when it can. The server looks again. */
export function pictureFault(file: { name: string; type: string; size: number }): string | null {
  const name = file.name === '' ? 'This picture' : file.name
  if (!(STILL_TYPES as readonly string[]).includes(file.type))
    return `${name} is no JPEG, PNG or WebP. Keep it as one of these first.`
  if (file.size > LIMITS.stillBytes)
    return `${name} has ${Math.ceil(file.size / MB)} MB, and ${LIMITS.stillBytes / MB} is the most. Make it smaller.`
  if (file.size === 0) return `${name} is empty. Take it again.`
  return null
}

/** How many of the new pictures still fit, and what to say when some do not. */
export function roomFor(there: number, wanted: number): { take: number; fault: string | null } {
  const take = Math.max(0, Math.min(wanted, LIMITS.stillsAPossession - there))
  if (take === wanted) return { take, fault: null }
  const over = wanted - take
  return {
    take,
    fault: `A possession holds ${LIMITS.stillsAPossession} stills. ${over === 1 ? 'One picture was' : `${over} pictures were`} left out.`,
  }
}
