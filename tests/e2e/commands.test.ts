import { randomUUID } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { runCommand } from '../support/command'
import { possessionBody } from '../support/fixture'
import { startProduct, type Product } from '../support/product'

/** The commands of the built product, each a process of its own beside a running server. */
let root: string
beforeAll(async () => {
  root = await mkdtemp(join(tmpdir(), 'overtop-commands-'))
})
afterAll(() => rm(root, { recursive: true, force: true }))

type Rows = { rows: { id: string; stills?: { id: string }[] }[] }

/** Signed in over the network; `get` answers with what was sent back, read as JSON. */
async function signIn(product: Product, email: string, password: string) {
  const answer = await fetch(`${product.url}/api/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email, password }),
  })
  const cookie = answer.headers.getSetCookie()[0]?.split(';')[0] ?? ''
  const session = (await answer.json()) as { teams?: { id: string; name: string }[] }
  const base = `${product.url}/api/teams/${session.teams?.[0]?.id ?? ''}`
  const ask = (path: string, init: RequestInit = {}) =>
    fetch(base + path, { ...init, headers: { Cookie: cookie, 'Content-Type': 'application/json' } })
  const get = async (path: string) => (await ask(path)).json() as Promise<Rows>
  return { status: answer.status, team: session.teams?.[0]?.name, ask, get }
}
type SignedIn = Awaited<ReturnType<typeof signIn>>

/** Every possession of every scouted game, and the still ids on them. */
async function everything({ get }: SignedIn) {
  const opponents = (await get('/opponents')).rows
  const ids: string[] = []
  const stills: string[] = []
  const games: string[] = []
  for (const opponent of opponents)
    games.push(...(await get(`/opponents/${opponent.id}/scouted-games`)).rows.map(({ id }) => id))
  for (const game of new Set(games))
    for (const row of (await get(`/scouted-games/${game}/possessions`)).rows) {
      ids.push(row.id)
      stills.push(...(row.stills ?? []).map(({ id }) => id))
    }
  return { ids, stills, games: [...new Set(games)] }
}

describe('npm run backup and npm run restore', () => {
  it('copy a server that is being written to, and make another one that answers the same', async () => {
    const live = join(root, 'live')
    const fresh = join(root, 'fresh')
    const safe = join(root, 'safe')
    const product = await startProduct({}, live)
    let before: Awaited<ReturnType<typeof everything>>
    let folder: string
    const written: string[] = []
    try {
      const tomas = await signIn(product, 'tomas@harrowcreek.example', 'over-the-top')
      before = await everything(tomas)
      const game = before.games[0] ?? ''
      const writing = (async () => {
        for (let number = 500; number < 550; number += 1) {
          const id = randomUUID()
          const body = JSON.stringify(possessionBody(game, { number }))
          expect((await tomas.ask(`/possessions/${id}`, { method: 'PUT', body })).status).toBe(201)
          written.push(id)
        }
      })()
      const backup = await runCommand(['backup', safe], { DATA_DIR: live })
      await writing
      expect(backup).toMatchObject({
        code: 0,
        printed: expect.stringContaining('Checked: nothing is missing.'),
      })
      folder = /It is in (\S+)\. /.exec(backup.printed)?.[1] ?? ''

      const refused = await runCommand(['restore', folder, '--replace'], { DATA_DIR: live })
      expect(refused.code).toBe(1)
      expect(refused.printed).toMatch(
        /^\S+ is in use by process \d+\. Stop the server, then restore\. Nothing was changed\.\n$/,
      )
    } finally {
      await product.stop()
    }

    const restored = await runCommand(['restore', folder], { DATA_DIR: fresh })
    expect(restored).toMatchObject({ code: 0, printed: expect.stringContaining('each as it was backed up') })
    const again = await startProduct({ DEMO: 'off' }, fresh)
    try {
      const tomas = await signIn(again, 'tomas@harrowcreek.example', 'over-the-top')
      const after = await everything(tomas)
      expect(after.ids).toEqual(expect.arrayContaining(before.ids))
      // What was written meanwhile is there up to one instant, in the order it was written, and nothing after.
      const kept = written.filter((id) => after.ids.includes(id))
      expect(kept).toEqual(written.slice(0, kept.length))
      expect(after.ids).toHaveLength(before.ids.length + kept.length)
      expect(before.stills.length).toBeGreaterThan(0)
      for (const still of before.stills) {
        const picture = await tomas.ask(`/stills/${still}`)
        expect(picture.status).toBe(200)
        expect((await picture.arrayBuffer()).byteLength).toBeGreaterThan(1000)
      }
    } finally {
      await again.stop()
    }
  })

  it('a second server is refused the folder of the first, in one line', async () => {
    const folder = join(root, 'shared')
    const product = await startProduct({ DEMO: 'off' }, folder)
    try {
      await expect(startProduct({ DEMO: 'off' }, folder)).rejects.toThrow(
        /the server stopped with 1: \S+ is in use by process \d+\. Stop it first, or set DATA_DIR to another folder\.\n$/,
      )
    } finally {
      await product.stop()
    }
  })
})

describe('npm run first-coach', () => {
  const args = [
    ...['--name', 'Ada Fennimore', '--email', 'ada@club.example', '--team', 'Saltmarsh Otters'],
    ...['--squad', 'U15 girls', '--zone', 'Europe/Oslo', '--rules', 'fiba'],
  ]
  const password = 'nine tall otters'

  it('beside an empty server lets the first head coach in at once, and nobody a second time', async () => {
    const folder = join(root, 'club')
    const product = await startProduct({ DEMO: 'off' }, folder)
    try {
      const env = { DATA_DIR: folder, PUBLIC_URL: product.url }
      const wrong = await runCommand(['first-coach', ...args, '--zone', 'Mars'], env, `${password}\n`)
      expect(wrong).toEqual({
        code: 1,
        printed: '--zone: This is not a time zone. Write it as Europe/London.\n',
      })
      const made = await runCommand(['first-coach', ...args], env, `${password}\n`)
      expect(made.code).toBe(0)
      expect(made.printed).toContain(`Sign in at ${product.url} as ada@club.example`)
      expect(made.printed).not.toContain(password)
      const ada = await signIn(product, 'ada@club.example', password)
      expect(ada).toMatchObject({ status: 201, team: 'Saltmarsh Otters' })
      expect((await ada.get('/counters')).rows.length).toBeGreaterThan(0)
      const second = await runCommand(['first-coach', ...args], env, `${password}\n`)
      expect(second.code).toBe(1)
      expect(second.printed).toMatch(/^There is a team already/)
    } finally {
      await product.stop()
    }
    const plain = await startProduct({}, folder)
    try {
      expect((await signIn(plain, 'ada@club.example', password)).status).toBe(201)
      expect(plain.printed()).not.toMatch(/over-the-top|maren/)
    } finally {
      await plain.stop()
    }
  })
})
