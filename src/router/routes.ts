import type { RouteRecordRaw } from 'vue-router'
import type { Action } from '@shared/session/schemas'
import { newId } from '@/composables/newId'

declare module 'vue-router' {
  interface RouteMeta {
    /** First words of the window's title until the page knows better. */
    title?: string
    /** Needs nobody signed in. */
    open?: boolean
    /** The word of the main nav that this page belongs to. */
    section?: 'week' | 'opponents' | 'library' | 'squad' | 'sheets'
    /** `match`: the page fills the bar's middle itself; `none`: the page has no bar of ours at all. */
    bar?: 'match' | 'none'
    /** Without this right the page shows who can instead. */
    needs?: Action
  }
}

/** Pages of one team, below /t/:team. Every view is fetched when it is first opened. */
const teamPages: RouteRecordRaw[] = [
  { path: '', name: 'team-home', component: () => import('@/views/shell/NotFoundView.vue') },
  {
    path: 'week',
    name: 'week',
    component: () => import('@/views/week/WeekView.vue'),
    meta: { title: 'This week', section: 'week', needs: 'game:read' },
  },
  {
    path: 'opponents',
    name: 'opponents',
    component: () => import('@/views/opponents/OpponentsView.vue'),
    meta: { title: 'Opponents', section: 'opponents', needs: 'opponent:read' },
  },
  {
    path: 'opponents/:opponent',
    name: 'opponent',
    redirect: (to) => ({ name: 'read', params: to.params }),
  },
  {
    path: 'opponents/:opponent/about',
    name: 'about-opponent',
    component: () => import('@/views/opponents/AboutView.vue'),
    props: true,
    meta: { title: 'About them', section: 'opponents', needs: 'opponent:read' },
  },
  {
    path: 'opponents/:opponent/scouted-games',
    name: 'scouted-games',
    component: () => import('@/views/scoutedGames/ScoutedGamesView.vue'),
    props: true,
    meta: { title: 'Scout', section: 'opponents', needs: 'scouting:read' },
  },
  {
    path: 'scouted-games/:game/log',
    name: 'log',
    component: () => import('@/views/possessions/LogView.vue'),
    props: true,
    meta: { title: 'Log', section: 'opponents', bar: 'match', needs: 'scouting:write' },
  },
  {
    path: 'games/:game/log',
    name: 'game-log',
    component: () => import('@/views/possessions/LogView.vue'),
    props: (to) => ({ game: to.params.game, ours: true }),
    meta: { title: 'Log', section: 'opponents', bar: 'match', needs: 'scouting:write' },
  },
  {
    path: 'opponents/:opponent/read',
    name: 'read',
    component: () => import('@/views/tendencies/ReadView.vue'),
    props: true,
    meta: { title: 'Read', section: 'opponents', needs: 'scouting:read' },
  },
  {
    path: 'opponents/:opponent/possessions',
    name: 'possessions',
    component: () => import('@/views/possessionTable/PossessionsView.vue'),
    props: true,
    meta: { title: 'Possessions', section: 'opponents', needs: 'scouting:read' },
  },
  {
    path: 'games/:game/choose',
    name: 'choose',
    component: () => import('@/views/choices/ChooseView.vue'),
    props: true,
    meta: { title: 'Choose', section: 'opponents', needs: 'plan:read' },
  },
  {
    path: 'games/:game/teach',
    name: 'teach',
    component: () => import('@/views/teach/TeachView.vue'),
    props: true,
    meta: { title: 'Teach', section: 'opponents', needs: 'practice:read' },
  },
  {
    path: 'library',
    name: 'library',
    component: () => import('@/views/counters/LibraryView.vue'),
    meta: { title: 'Library', section: 'library', needs: 'counter:read' },
  },
  {
    path: 'library/new',
    name: 'new-counter',
    redirect: ({ params, query }) => ({
      name: 'board',
      params: { ...params, counter: newId() },
      query: { ...query, new: '1' },
    }),
  },
  {
    path: 'library/:counter/draw',
    name: 'board',
    component: () => import('@/views/board/BoardView.vue'),
    props: true,
    meta: { title: 'Drawing board', section: 'library', needs: 'counter:write' },
  },
  {
    path: 'library/:counter',
    name: 'counter',
    component: () => import('@/views/counters/CounterView.vue'),
    props: true,
    meta: { title: 'Counter', section: 'library', needs: 'counter:read' },
  },
  {
    path: 'rules',
    name: 'rules',
    component: () => import('@/views/rules/RulesView.vue'),
    meta: { title: 'Rules', section: 'library', needs: 'rule:read' },
  },
  {
    path: 'squad',
    name: 'squad',
    component: () => import('@/views/squad/SquadView.vue'),
    meta: { title: 'Squad', section: 'squad', needs: 'squad:read' },
  },
  {
    path: 'people',
    name: 'people',
    component: () => import('@/views/people/PeopleView.vue'),
    meta: { title: 'People', section: 'squad', needs: 'team:read' },
  },
  {
    path: 'letters',
    name: 'letters',
    component: () => import('@/views/mail/LettersView.vue'),
    meta: { title: 'Letters', section: 'squad', needs: 'mail:read' },
  },
  {
    path: 'settings',
    name: 'settings',
    component: () => import('@/views/team/SettingsView.vue'),
    meta: { title: 'Team', section: 'squad', needs: 'team:read' },
  },
  {
    path: 'sheets',
    name: 'sheets',
    component: () => import('@/views/sheets/SheetListView.vue'),
    meta: { title: 'Sheets', section: 'sheets', needs: 'sheet:read' },
  },
  {
    path: 'sheets/:sheet',
    name: 'sheet',
    component: () => import('@/views/sheets/SheetView.vue'),
    props: true,
    meta: { title: 'Sheet', section: 'sheets', bar: 'none', needs: 'sheet:read' },
  },
]

export const routes: RouteRecordRaw[] = [
  // The two homes never show themselves: the router sends them on by teams and role.
  { path: '/', name: 'home', component: () => import('@/views/shell/NotFoundView.vue') },
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/views/session/SignInView.vue'),
    meta: { title: 'Sign in', open: true },
  },
  {
    path: '/forgotten-password',
    name: 'forgotten-password',
    component: () => import('@/views/session/ForgottenPasswordView.vue'),
    meta: { title: 'Forgotten password', open: true },
  },
  {
    path: '/new-password',
    name: 'new-password',
    component: () => import('@/views/session/NewPasswordView.vue'),
    meta: { title: 'New password', open: true },
  },
  {
    path: '/me',
    name: 'you',
    component: () => import('@/views/session/YouView.vue'),
    meta: { title: 'You' },
  },
  {
    path: '/join',
    name: 'join',
    component: () => import('@/views/people/JoinView.vue'),
    meta: { title: 'Join a team', open: true },
  },
  {
    path: '/first-run',
    name: 'first-run',
    component: () => import('@/views/firstRun/FirstRunView.vue'),
    meta: { title: 'Set the first team up', open: true },
  },
  {
    path: '/teams',
    name: 'teams',
    component: () => import('@/views/session/TeamChooserView.vue'),
    meta: { title: 'Your teams' },
  },
  {
    path: '/t/:team',
    component: () => import('@/views/shell/TeamShell.vue'),
    children: teamPages,
  },
  {
    path: '/no-signal',
    name: 'no-signal',
    component: () => import('@/views/shell/NoSignalView.vue'),
    meta: { title: 'No signal', open: true },
  },
  {
    path: '/:path(.*)*',
    name: 'not-found',
    component: () => import('@/views/shell/NotFoundView.vue'),
    meta: { title: 'Not here', open: true },
  },
]
