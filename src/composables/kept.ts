/** What this device keeps while it cannot be sent. Every value has a key of its own, so that two windows do not overwrite each other. */

const ROOT = 'overtop.kept'

export const keyOf = (...parts: readonly string[]): string => [ROOT, ...parts].join('.')

/** False when the browser keeps nothing (private window), or no more even without the copies of pages. */
export function keep(key: string, value: unknown): boolean {
  const text = JSON.stringify(value)
  if (tryKeep(key, text)) return true
  // Copies can be fetched again; what somebody said cannot.
  if (isCopy(key)) return false
  try {
    for (const each of Object.keys(localStorage).filter(isCopy)) localStorage.removeItem(each)
  } catch {
    return false
  }
  return tryKeep(key, text)
}

const isCopy = (key: string): boolean => key.startsWith(`${ROOT}.copy.`)

function tryKeep(key: string, text: string): boolean {
  try {
    localStorage.setItem(key, text)
    return true
  } catch {
    return false
  }
}

export function forget(key: string): void {
  try {
    localStorage.removeItem(key)
  } catch {
    // Nothing was kept.
  }
}

/** The value of a key as `read` takes it; null when there is none or it cannot be read. */
export function recall<T>(key: string, read: (value: unknown) => T | null): T | null {
  try {
    const text = localStorage.getItem(key)
    return text === null ? null : read(JSON.parse(text) as unknown)
  } catch {
    return null
  }
}

/** Every readable value below a key, in no order. */
export function recallAll<T>(below: string, read: (value: unknown) => T | null): T[] {
  try {
    return Object.keys(localStorage)
      .filter((key) => key.startsWith(`${below}.`))
      .map((key) => recall(key, read))
      .filter((value): value is T => value !== null)
  } catch {
    return []
  }
}

/** Below this key lie the rows of one person and one scouted game that are not sent yet. */
export const outboxKey = (person: string, game: string): string => keyOf('rows', person, game)
