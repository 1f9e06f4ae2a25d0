import { join } from 'node:path'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { firstCoachCommand } from '@server/commands/firstCoach'
import { addFirstCoach } from '@server/features/people/firstCoach.service'
import type { Terminal } from '@server/commands/terminal'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_RULES } from '@server/database/demo/rules'
import { Person } from '@server/database/entities/Person'
import { Team } from '@server/database/entities/Team'
import type { CounterRow } from '@shared/counters/schemas'
import { startTestApp, type TestApp } from '../support/testApp'

const NOW = new Date('2026-03-17T09:42:00Z')
const PASSWORD = 'nine tall otters'
const ARGS = [
  ...['--name', 'Ada Fennimore', '--email', 'Ada@Club.Example', '--team', 'Saltmarsh Otters'],
  ...['--squad', 'U15 girls', '--zone', 'Europe/Oslo', '--rules', 'nfhs84'],
]

let test: TestApp
let said: string[]
beforeEach(async () => {
  test = await startTestApp({ now: NOW, empty: true })
  said = []
})
afterEach(() => test.stop())

const terminal = (password: string): Terminal => ({
  interactive: false,
  say: (line) => said.push(line),
  ask: () => Promise.reject(new Error('nobody is there')),
  askHidden: () => Promise.reject(new Error('nobody is there')),
  readLine: () => Promise.resolve(password),
})
/** The command beside the running app, on the same file, as a person runs it. */
const run = (args: string[] = ARGS, password = PASSWORD) =>
  firstCoachCommand(args, {
    config: { ...test.context.config, port: 3000 },
    terminal: terminal(password),
    clock: () => NOW,
  })
const counts = async () => {
  const { manager } = test.context.db
  return { teams: await manager.count(Team), people: await manager.count(Person) }
}

describe('npm run first-coach', () => {
  it('makes a head coach who signs in and finds the counters and rules to start from, none of them used', async () => {
    await run()
    expect(said.join('\n')).toContain('Sign in at http://127.0.0.1:3000 as ada@club.example')
    expect(said.join('\n')).not.toContain(PASSWORD)
    const agent = request.agent(test.app)
    const session = await agent.post('/api/session').send({ email: 'ada@club.example', password: PASSWORD })
    expect(session.status).toBe(201)
    expect(session.body).toMatchObject({
      person: { name: 'Ada Fennimore' },
      teams: [
        {
          name: 'Saltmarsh Otters',
          squadName: 'U15 girls',
          timeZone: 'Europe/Oslo',
          season: '2025/26',
          rulePack: 'nfhs84',
          role: 'head-coach',
        },
      ],
    })
    const team = session.body.teams[0].id as string
    const counters = (await agent.get(`/api/teams/${team}/counters`)).body.rows as CounterRow[]
    expect(counters.map(({ name }) => name).sort()).toEqual(DEMO_COUNTERS.map(({ name }) => name).sort())
    for (const { liveReps, practice } of counters)
      expect({ liveReps, practice }).toEqual({ liveReps: 0, practice: { k: 0, n: 0 } })
    const rules = await agent.get(`/api/teams/${team}/rules`)
    expect(rules.body.rows).toHaveLength(DEMO_RULES.length)
  })

  it('refuses a second time, before it asks anything, and adds nobody', async () => {
    await run()
    said = []
    await expect(run(['--nonsense'])).rejects.toThrow(/There is a team already, so nobody was added/)
    await expect(
      addFirstCoach(
        test.context.db,
        {
          name: 'B',
          email: 'b@club.example',
          team: 'B',
          squad: 'B',
          zone: 'UTC',
          rules: 'fiba',
          password: PASSWORD,
        },
        NOW,
      ),
    ).rejects.toThrow(/There is a team already/)
    expect(await counts()).toEqual({ teams: 1, people: 1 })
    expect(said).toEqual([])
  })

  it('adds one when two run at the same moment', async () => {
    const both = await Promise.allSettled([run(), run()])
    expect(both.map(({ status }) => status).sort()).toContain('fulfilled')
    expect(await counts()).toEqual({ teams: 1, people: 1 })
  })

  it('names the fields that cannot be taken, and adds nobody', async () => {
    await expect(run([...ARGS, '--email', 'ada', '--rules', 'beach'], 'short')).rejects.toMatchObject({
      lines: [
        '--email: This is not a mail address. Write it as name@club.example.',
        '--rules: Choose one of: fiba, nfhs84, nfhs94, ncaa, nba.',
        'password: Use at least 10 characters.',
      ],
    })
    expect(await counts()).toEqual({ teams: 0, people: 0 })
  })

  it('works in a folder that no server has been started in', async () => {
    const dataDir = join(test.dataDir, 'new club')
    await firstCoachCommand(ARGS, {
      config: { ...test.context.config, dataDir, publicUrl: 'https://overtop.club.example' },
      terminal: terminal(PASSWORD),
      clock: () => NOW,
    })
    expect(said.join('\n')).toContain('Sign in at https://overtop.club.example')
  })
})
