import { createApp } from 'vue'
import { createPinia } from 'pinia'
import { z } from 'zod'
import '@fontsource-variable/archivo/standard.css'
import './styles/tokens.css'
import './styles/type.css'
import './styles/base.css'
import './styles/element.css'
import App from './App.vue'
import { onSignedOut } from './api/http'
import { useLights } from './composables/useLights'
import { createAppRouter } from './router/router'
import { useSessionStore } from './stores/session'

// The content policy forbids code made from text, which the schemas would try for speed.
z.config({ jitless: true })

const pinia = createPinia()
const session = useSessionStore(pinia)
const router = createAppRouter(session)

// Whichever request learns that the session has ended: sign-in comes up and keeps the address.
onSignedOut(() => {
  const wasSignedIn = session.isSignedIn
  session.forget()
  const here = router.currentRoute.value
  if (wasSignedIn && here.meta.open !== true)
    void router.replace({ name: 'sign-in', query: { to: here.fullPath } })
})

useLights().recall()
createApp(App).use(pinia).use(router).mount('#app')

// Only what was built has a worker; without one the pages work as ever, they just need a signal.
if (import.meta.env.PROD && 'serviceWorker' in navigator)
  window.addEventListener(
    'load',
    () => void navigator.serviceWorker.register('/serviceWorker.js').catch(() => null),
  )
