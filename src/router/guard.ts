import type { RouteLocationNormalized, RouteLocationRaw } from 'vue-router'
import { OfflineError } from '@/api/problems'
import type { SessionStore } from '@/stores/session'

/**
 * The address to go on to after sign-in, or null when it is none of ours. Only a path on this origin is taken:
 * "//host" and "/\host" are other hosts to a browser, and control characters hide them.
 */
export function safePath(wanted: unknown): string | null {
  if (typeof wanted !== 'string' || !/^\/(?![/\\])/.test(wanted)) return null
  if ([...wanted].some((letter) => letter < ' ' || letter === '\\')) return null
  const origin = 'http://here.invalid'
  const url = new URL(wanted, origin)
  if (url.origin !== origin || url.pathname === '/sign-in') return null
  return url.pathname + url.search + url.hash
}

/** Lets signed-in people through, sends others to sign-in with the address kept, and opens the team in the path. */
export async function guard(
  to: RouteLocationNormalized,
  session: SessionStore,
): Promise<boolean | RouteLocationRaw> {
  if (to.name === 'no-signal') return true
  try {
    await session.load()
  } catch (error) {
    const why = error instanceof OfflineError ? {} : { why: 'answer' }
    return { name: 'no-signal', query: { to: to.fullPath, ...why }, replace: true }
  }
  if (to.name === 'sign-in' && session.isSignedIn) return safePath(to.query.to) ?? { name: 'home' }
  if (to.meta.open === true) return true
  if (!session.isSignedIn)
    return { name: 'sign-in', query: to.fullPath === '/' ? {} : { to: to.fullPath }, replace: true }
  const team = to.params.team
  if (typeof team === 'string' && !session.enter(team)) return notFound(to)
  return true
}

/** Where "/" and a team's bare address lead: one team needs no choosing, staff starts at the week. */
export function homeOf(session: SessionStore, teamId?: string): RouteLocationRaw {
  const [only, ...more] = session.teams
  const team = teamId === undefined ? only : session.teams.find((each) => each.id === teamId)
  if (team === undefined || (teamId === undefined && more.length > 0)) return { name: 'teams' }
  return { name: team.can.includes('game:read') ? 'week' : 'sheets', params: { team: team.id } }
}

/** The not-found page under the address that was asked for. */
export function notFound(to: Pick<RouteLocationNormalized, 'path' | 'query' | 'hash'>): RouteLocationRaw {
  return {
    name: 'not-found',
    params: { path: to.path.substring(1).split('/') },
    query: to.query,
    hash: to.hash,
    replace: true,
  }
}
