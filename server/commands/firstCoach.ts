import { randomUUID } from 'node:crypto'
import { join } from 'node:path'
import type { DataSource } from 'typeorm'
import type { FirstCoach } from '@shared/session/firstCoach'
import type { Clock } from '../adapters/clock'
import { hashPassword } from '../adapters/passwords'
import { DATABASE_FILE } from '../backup/manifest'
import type { Config } from '../config'
import { openDatabase } from '../database/dataSource'
import { DEMO_COUNTERS } from '../database/demo/counters'
import { seasonOf } from '../database/demo/days'
import { DEMO_RULES } from '../database/demo/rules'
import { Membership } from '../database/entities/Membership'
import { Person } from '../database/entities/Person'
import { Team } from '../database/entities/Team'
import { insertBook, unused } from '../database/insertBook'
import { CommandError } from './commandError'
import { collectAnswers } from './firstCoachAnswers'
import type { Terminal } from './terminal'

const TEAM_THERE =
  'There is a team already, so nobody was added. Sign in as its head coach, or set DATA_DIR to an empty folder.'

/**
 * The first team of an empty database with its head coach, and the counters and rules it starts from. All or
 * nothing.
 * @throws CommandError when there is a team or a person already.
 */
export async function addFirstCoach(db: DataSource, coach: FirstCoach, now: Date): Promise<void> {
  const passwordHash = await hashPassword(coach.password)
  const createdAt = now.toISOString()
  const teamId = randomUUID()
  const personId = randomUUID()
  await db.transaction(async (manager) => {
    await refuseTeams(manager.getRepository(Team))
    if ((await manager.count(Person)) > 0) throw new CommandError(TEAM_THERE)
    await manager.insert(Team, {
      id: teamId,
      name: coach.team,
      squadName: coach.squad,
      timeZone: coach.zone,
      season: seasonOf(now, coach.zone),
      rulePack: coach.rules,
      createdAt,
    })
    await manager.insert(Person, {
      id: personId,
      email: coach.email,
      name: coach.name,
      passwordHash,
      createdAt,
    })
    await manager.insert(Membership, {
      id: randomUUID(),
      teamId,
      personId,
      role: 'head-coach',
      squadPlayerId: null,
    })
    await insertBook(manager, {
      teamId,
      now,
      counters: unused(DEMO_COUNTERS),
      rules: DEMO_RULES,
      idOf: () => randomUUID(),
    })
  })
}

async function refuseTeams(teams: { count: () => Promise<number> }): Promise<void> {
  if ((await teams.count()) > 0) throw new CommandError(TEAM_THERE)
}

/** `npm run first-coach`. @throws CommandError */
export async function firstCoachCommand(
  args: readonly string[],
  { config, terminal, clock }: { config: Config; terminal: Terminal; clock: Clock },
): Promise<void> {
  const db = await openDatabase(join(config.dataDir, DATABASE_FILE))
  try {
    // Before anything is asked: nobody should answer seven questions for nothing.
    await refuseTeams(db.getRepository(Team))
    const coach = await collectAnswers(args, terminal)
    await addFirstCoach(db, coach, clock())
    const address =
      config.publicUrl ??
      `http://${config.host === '0.0.0.0' ? 'localhost' : config.host}:${config.port || 3000}`
    terminal.say(
      `${coach.team}, ${coach.squad}: ${coach.name} is head coach. The team has ${DEMO_COUNTERS.length} counters and ${DEMO_RULES.length} rules to start from.`,
    )
    terminal.say(`Sign in at ${address} as ${coach.email}. If the server is not running: DEMO=off npm start`)
  } finally {
    await db.destroy()
  }
}
