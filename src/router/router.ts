import {
  createRouter,
  createWebHistory,
  START_LOCATION,
  type RouteRecordRaw,
  type Router,
  type RouterHistory,
  type RouterScrollBehavior,
} from 'vue-router'
import type { SessionStore } from '@/stores/session'
import { guard, homeOf } from './guard'
import { focusPage } from './focusPage'
import { routes as appRoutes } from './routes'

/** The router with its guard, titles, focus and scroll; all it stands on comes in, so that tests can bring their own. */
export function createAppRouter(
  session: SessionStore,
  history: RouterHistory = createWebHistory(),
  routes: readonly RouteRecordRaw[] = appRoutes,
): Router {
  const router = createRouter({
    history,
    scrollBehavior,
    routes: [...routes],
  })

  router.beforeEach((to) => guard(to, session))
  router.beforeEach((to) => {
    if (to.name === 'home') return homeOf(session)
    if (to.name === 'team-home') return homeOf(session, String(to.params.team))
    return true
  })

  router.afterEach((to, from, failure) => {
    if (failure !== undefined) return
    if (to.meta.title !== undefined) document.title = `${to.meta.title} · Overtop`
    if (from !== START_LOCATION && to.path !== from.path) void focusPage()
  })

  return router
}

/** Back and forward return to where the page was; it may have to grow first, so wait a moment for its rows. */
const scrollBehavior: RouterScrollBehavior = async (to, from, saved) => {
  if (saved === null) return to.path === from.path ? false : { top: 0, left: 0 }
  for (let frame = 0; frame < 60; frame += 1) {
    if (document.documentElement.scrollHeight >= saved.top + window.innerHeight) break
    await new Promise((resolve) => requestAnimationFrame(resolve))
  }
  return saved
}
