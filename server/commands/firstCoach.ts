import { join } from 'node:path'
import type { DataSource } from 'typeorm'
import type { FirstCoach } from '@shared/session/firstCoach'
import type { Clock } from '../adapters/clock'
import { DATABASE_FILE } from '../backup/manifest'
import type { Config } from '../config'
import { openDatabase } from '../database/dataSource'
import { DEMO_COUNTERS } from '../database/demo/counters'
import { DEMO_RULES } from '../database/demo/rules'
import { Team } from '../database/entities/Team'
import { addFirstCoach, TeamThere } from '../features/people/firstCoach.service'
import { CommandError } from './commandError'
import { collectAnswers } from './firstCoachAnswers'
import type { Terminal } from './terminal'

const TEAM_THERE =
  'There is a team already, so nobody was added. Sign in as its head coach, or set DATA_DIR to an empty folder.'

/** As the service does it. @throws CommandError when there is a team or a person already. */
async function add(db: DataSource, coach: FirstCoach, now: Date): Promise<void> {
  try {
    await addFirstCoach(db, coach, now)
  } catch (error) {
    throw error instanceof TeamThere ? new CommandError(TEAM_THERE) : error
  }
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
    await add(db, coach, clock())
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
