import type { Page } from 'playwright-core'

/** Every page that a staff has, with a row of the invented club in it; the key says what is on it. */
export const STAFF_PAGES = {
  week: '/t/{team}/week',
  opponents: '/t/{team}/opponents',
  'about an opponent': '/t/{team}/opponents/{opponent}/about',
  'scouted games': '/t/{team}/opponents/{opponent}/scouted-games',
  log: '/t/{team}/scouted-games/{scouted}/log',
  'log of our own game': '/t/{team}/games/{game}/log',
  read: '/t/{team}/opponents/{opponent}/read',
  'read, a habit open': '/t/{team}/opponents/{opponent}/read?habit=press',
  possessions: '/t/{team}/opponents/{opponent}/possessions',
  choose: '/t/{team}/games/{game}/choose',
  'choose, nothing known': '/t/{team}/games/{unknown}/choose',
  teach: '/t/{team}/games/{signed}/teach',
  'teach, nothing signed': '/t/{team}/games/{game}/teach',
  library: '/t/{team}/library',
  counter: '/t/{team}/library/{counter}?step=1',
  board: '/t/{team}/library/{counter}/draw',
  'a new counter': '/t/{team}/library/new',
  rules: '/t/{team}/rules',
  squad: '/t/{team}/squad',
  people: '/t/{team}/people',
  letters: '/t/{team}/letters',
  settings: '/t/{team}/settings',
  sheets: '/t/{team}/sheets',
  sheet: '/t/{team}/sheets/{sheet}',
  you: '/me',
} as const
export type StaffPage = keyof typeof STAFF_PAGES

/** Fills an address with rows of the team that the page is signed in to. */
export async function staffAddresses(page: Page): Promise<(name: StaffPage) => string> {
  const [, team = ''] = /\/t\/([^/]+)/.exec(page.url()) ?? []
  const rows = async (path: string) => {
    const answer = await page.request.get(`/api/teams/${team}${path}`)
    return ((await answer.json()) as { rows: Record<string, string>[] }).rows
  }
  const games = await rows('/games')
  const against = (name: string) => games.find((game) => game['opponentName'] === name) ?? {}
  const opponent = against('Port Selby Gulls')['opponentId'] ?? ''
  const at: Record<string, string> = {
    team,
    opponent,
    game: against('Port Selby Gulls')['id'] ?? '',
    unknown: against('Tarn Valley')['id'] ?? '',
    signed: games.find(({ station }) => station === 'teach')?.['id'] ?? '',
    scouted: (await rows(`/opponents/${opponent}/scouted-games`))[0]?.['id'] ?? '',
    counter: (await rows('/counters'))[0]?.['id'] ?? '',
    sheet: (await rows('/sheets'))[0]?.['id'] ?? '',
  }
  for (const [name, id] of Object.entries(at)) if (id === '') throw new Error(`the demo has no ${name}`)
  return (name) => STAFF_PAGES[name].replace(/\{(\w+)\}/g, (_, row: string) => at[row] ?? '')
}

/** The page has said what it has to say, and waits for nothing. */
export async function settled(page: Page): Promise<void> {
  await page.locator('main h1').first().waitFor()
  await page.waitForLoadState('networkidle')
  await page.locator('[aria-busy="true"]').first().waitFor({ state: 'detached' })
}
