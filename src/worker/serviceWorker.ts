/// <reference lib="webworker" />
import { cleanupOutdatedCaches, createHandlerBoundToURL, precacheAndRoute } from 'workbox-precaching'
import { NavigationRoute, registerRoute } from 'workbox-routing'
import { NetworkFirst } from 'workbox-strategies'
import { isKept, KEPT_AT, KEPT_CACHE } from './kept'

declare const self: ServiceWorkerGlobalScope

/** Seconds to wait for a weak signal before the copy is shown. */
const PATIENCE = 4
/** Answers after which a copy must not be shown again: signed out, not allowed, gone, called back. */
const OVER = [401, 403, 404, 410]

/** A copy with the time at which it was fetched, so that a page can say how old it is. */
async function stamped(response: Response): Promise<Response> {
  const headers = new Headers(response.headers)
  headers.set(KEPT_AT, new Date().toISOString())
  return new Response(await response.blob(), { status: response.status, headers })
}

async function forget(request: Request, status: number): Promise<void> {
  const cache = await caches.open(KEPT_CACHE)
  const signedOut = status === 401
  for (const kept of await cache.keys())
    if (signedOut || kept.url === request.url) await cache.delete(kept, { ignoreVary: true })
}

// The page itself and its parts; a new version takes over with the next page.
precacheAndRoute(self.__WB_MANIFEST)
cleanupOutdatedCaches()
registerRoute(
  new NavigationRoute(createHandlerBoundToURL('/index.html'), { denylist: [/^\/api\//, /^\/healthz/] }),
)

registerRoute(
  ({ url, request }) =>
    request.method === 'GET' && url.origin === self.location.origin && isKept(url.pathname),
  new NetworkFirst({
    cacheName: KEPT_CACHE,
    networkTimeoutSeconds: PATIENCE,
    plugins: [
      {
        cacheWillUpdate: async ({ response }) => (response.status === 200 ? stamped(response) : null),
        fetchDidSucceed: async ({ request, response }) => {
          if (OVER.includes(response.status)) await forget(request, response.status)
          return response
        },
      },
    ],
  }),
)

self.addEventListener('install', () => void self.skipWaiting())
self.addEventListener('activate', (event) => event.waitUntil(self.clients.claim()))
