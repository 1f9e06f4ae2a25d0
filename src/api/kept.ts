import { KEPT_AT, KEPT_CACHE } from '@/worker/kept'

/** Answers that came from this device for want of a signal, and when they were fetched. */
const keptAnswers = new WeakMap<object, number>()

/** When an answer was fetched, milliseconds since 1970, if it is a copy kept on this device; else null. */
export const keptAt = (answer: unknown): number | null =>
  typeof answer === 'object' && answer !== null ? (keptAnswers.get(answer) ?? null) : null

/** Remembers that an answer is a copy, where its headers say so. */
export function noteKept(answer: unknown, headers: Headers): void {
  const at = Date.parse(headers.get(KEPT_AT) ?? '')
  if (typeof answer === 'object' && answer !== null && !Number.isNaN(at)) keptAnswers.set(answer, at)
}

/** Whoever signs in or out next finds nothing of the one before on this device. */
export async function forgetKept(): Promise<void> {
  if ('caches' in globalThis) await caches.delete(KEPT_CACHE).catch(() => false)
}
