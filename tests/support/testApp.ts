import { randomUUID } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Express } from 'express'
import { pino } from 'pino'
import request from 'supertest'
import type { MailTransport } from '@server/adapters/mail/transport'
import { diskStillFiles } from '@server/adapters/stillFiles'
import { hashPassword } from '@server/adapters/passwords'
import { createApp } from '@server/app'
import type { Context } from '@server/context'
import { openDatabase } from '@server/database/dataSource'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { Team } from '@server/database/entities/Team'
import type { TeamRole } from '@shared/vocabulary'

export const PASSWORD = 'a long enough password'
const passwordHash = hashPassword(PASSWORD)

/** Two teams, each with one person per role; `both` is assistant in both. */
export const TEAM = '11111111-1111-4111-8111-111111111111'
export const OTHER_TEAM = '22222222-2222-4222-8222-222222222222'
export const PLAYER = '33333333-3333-4333-8333-333333333333'
export const OTHER_PLAYER = '44444444-4444-4444-8444-444444444444'

export type Who = 'head' | 'assistant' | 'player' | 'both' | 'otherHead' | 'nobodyYet'

const PEOPLE: Record<Who, { teamId: string; role: TeamRole; squadPlayerId?: string }[]> = {
  head: [{ teamId: TEAM, role: 'head-coach' }],
  assistant: [{ teamId: TEAM, role: 'assistant-coach' }],
  player: [{ teamId: TEAM, role: 'player', squadPlayerId: PLAYER }],
  both: [
    { teamId: TEAM, role: 'assistant-coach' },
    { teamId: OTHER_TEAM, role: 'assistant-coach' },
  ],
  otherHead: [{ teamId: OTHER_TEAM, role: 'head-coach' }],
  nobodyYet: [],
}

export type Agent = ReturnType<typeof request.agent>

export interface TestApp {
  app: Express
  context: Context
  dataDir: string
  /** A signed-in agent of a person; signs in once and keeps the cookie. */
  as: (who: Who) => Promise<Agent>
  /** An agent without a session. */
  anonymous: () => ReturnType<typeof request>
  setNow: (now: Date) => void
  /** Closes the database and opens the same file again behind a new app. */
  stop: () => Promise<void>
}

const skills = { handle: 2, 'throw-in': 2, 'long-arm': 2, decide: 2, sprint: 2, screen: 2 }

async function seed(context: Context): Promise<void> {
  const stamp = context.clock().toISOString()
  const { manager } = context.db
  for (const [id, name] of [
    [TEAM, 'Herons'],
    [OTHER_TEAM, 'Others'],
  ] as const)
    await manager.insert(Team, {
      id,
      name,
      squadName: 'U17 girls',
      timeZone: 'Europe/London',
      season: '2026-27',
      rulePack: 'fiba',
      createdAt: stamp,
    })
  for (const [id, teamId, jersey] of [
    [PLAYER, TEAM, 4],
    [OTHER_PLAYER, OTHER_TEAM, 5],
  ] as const)
    await manager.insert(SquadPlayer, {
      id,
      teamId,
      jersey,
      firstName: 'Nell',
      lastName: 'Tavish',
      skills,
      outUntil: null,
      version: 1,
      createdAt: stamp,
      updatedAt: stamp,
    })
  for (const [who, memberships] of Object.entries(PEOPLE)) {
    const personId = randomUUID()
    await manager.insert(Person, {
      id: personId,
      email: `${who.toLowerCase()}@club.example`,
      name: `Test ${who}`,
      passwordHash: await passwordHash,
      createdAt: stamp,
    })
    for (const membership of memberships)
      await manager.insert(Membership, { squadPlayerId: null, ...membership, id: randomUUID(), personId })
  }
}

/** The real app on a real SQLite file in a folder of its own. */
export async function startTestApp(
  options: { now?: Date; publicUrl?: string; empty?: boolean; mail?: MailTransport } = {},
): Promise<TestApp> {
  const dataDir = await mkdtemp(join(tmpdir(), 'overtop-test-'))
  let now = options.now ?? new Date('2026-03-17T09:42:00Z')
  const context: Context = {
    config: {
      port: 0,
      host: '127.0.0.1',
      dataDir,
      publicUrl: options.publicUrl ?? null,
      sessionSecret: null,
      demo: false,
      backupDays: 30,
      mailUrl: null,
      mailFrom: null,
      logLevel: 'silent',
    },
    db: await openDatabase(join(dataDir, 'overtop.sqlite')),
    clock: () => now,
    stillFiles: diskStillFiles(dataDir),
    mail: options.mail ?? null,
    log: pino({ level: 'silent' }),
    sessionSecret: 'test secret that is long enough to sign with',
  }
  if (!options.empty) await seed(context)
  const app = createApp(context)
  const agents = new Map<Who, Promise<Agent>>()
  const signIn = async (who: Who) => {
    const agent = request.agent(app)
    const answer = await agent
      .post('/api/session')
      .send({ email: `${who.toLowerCase()}@club.example`, password: PASSWORD })
    if (answer.status !== 201) throw new Error(`sign-in of ${who} answered ${answer.status}`)
    return agent
  }
  return {
    app,
    context,
    dataDir,
    as: (who) => {
      const agent = agents.get(who) ?? signIn(who)
      agents.set(who, agent)
      return agent
    },
    anonymous: () => request(app),
    setNow: (later) => {
      now = later
    },
    stop: async () => {
      await context.db.destroy()
      await rm(dataDir, { recursive: true, force: true })
    },
  }
}

/** The session cookie of a person, for clients that are not supertest's. */
export async function teamCookie(test: TestApp, who: Who): Promise<string> {
  const answer = await request(test.app)
    .post('/api/session')
    .send({ email: `${who.toLowerCase()}@club.example`, password: PASSWORD })
  const [cookie = ''] = (answer.headers['set-cookie'] as unknown as string[] | undefined) ?? []
  return cookie.split(';')[0] ?? ''
}
