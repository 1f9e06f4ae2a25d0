const KEY = 'overtop.join'

/** Keeps an invitation's secret in this window only, through a sign-in; null forgets it. */
export function keepJoinSecret(secret: string | null): void {
  try {
    if (secret === null) sessionStorage.removeItem(KEY)
    else sessionStorage.setItem(KEY, secret)
  } catch {
    // A browser that keeps nothing: the link has to be opened again after a sign-in.
  }
}

export function keptJoinSecret(): string | null {
  try {
    return sessionStorage.getItem(KEY)
  } catch {
    return null
  }
}
