import { In, type EntityManager } from 'typeorm'
import { proposeScript } from '@shared/practices/script'
import type { ScriptProposal, ScriptQuery } from '@shared/practices/schemas'
import { SHAPES } from '@shared/vocabulary'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { Plan } from '../../database/entities/Plan'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { dayInZone } from '../../http/zone'
import { bodyOfCounter } from '../counters/counters.presenter'
import { readOpponent, type OpponentRead } from '../tendencies/readOpponent'

const DAY_MS = 86_400_000
/** Back for so many days at most: on short turns (common practice, no source). */
const SHORT_TURNS_DAYS = 3

/** The script that is shared out from the read, for a practice before a game. @throws NotFound */
export async function scriptFor(
  manager: EntityManager,
  teamId: string,
  gameId: string,
  { minutes, startsAt }: ScriptQuery,
): Promise<ScriptProposal> {
  const game = await findInTeam(manager, Game, teamId, gameId, 'game')
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const instant = startsAt === undefined ? Date.parse(game.tipOff) - DAY_MS : Date.parse(startsAt)
  const looks = looksOf(await readOpponent(manager, game.opponentId, {}))
  const [plan] = await manager
    .getRepository(Plan)
    .find({ where: { gameId }, order: { number: 'DESC' }, take: 1 })
  const script = proposeScript({
    minutes,
    looks,
    changeUp: (plan?.changeUpId ?? null) !== null,
    blindScreens: await blindScreens(manager, teamId, [plan?.firstCallId, plan?.changeUpId]),
    ...(await whoIsOut(manager, teamId, (day) => dayInZone(new Date(instant + day * DAY_MS), team.timeZone))),
  })
  return { script, counted: looks.reduce((sum, { k }) => sum + k, 0) }
}

/** Counted throw-ins by shape; what was no press is shown too, for the five must know it when it comes. */
function looksOf(read: OpponentRead) {
  const countOf = (key: string) => read.tendencies.find((tendency) => tendency.key === key)
  const press = countOf('press')
  const fake = countOf('fake')?.k ?? 0
  const notPressed = Math.max(0, (press?.n ?? 0) - (press?.k ?? 0) - fake)
  return SHAPES.map(({ value: shape }) => {
    if (shape === 'fake') return { shape, k: fake }
    if (shape === 'dropped-back') return { shape, k: notPressed }
    return { shape, k: countOf(`shape:${shape}`)?.k ?? 0 }
  })
}

async function blindScreens(manager: EntityManager, teamId: string, ids: (string | null | undefined)[]) {
  const picked = ids.filter((id) => id !== null && id !== undefined)
  const rows = await manager.getRepository(Counter).findBy({ teamId, id: In(picked) })
  return rows.flatMap((row) => {
    const steps = bodyOfCounter(row)?.diagram.steps ?? []
    return steps.flatMap(({ moves }, at) =>
      moves.some((move) => move.kind === 'screen' && move.blind) ? [{ counter: row.name, step: at + 1 }] : [],
    )
  })
}

/** First names; `dayFrom` is the calendar day so many days after the practice. */
async function whoIsOut(manager: EntityManager, teamId: string, dayFrom: (days: number) => string) {
  const squad = await manager.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  const present = squad.filter(({ deletedAt }) => deletedAt === null)
  const [today, back] = [dayFrom(0), dayFrom(-SHORT_TURNS_DAYS)]
  const names = (test: (until: string) => boolean) =>
    present.filter(({ outUntil }) => outUntil !== null && test(outUntil)).map(({ firstName }) => firstName)
  return {
    out: names((until) => until >= today),
    shortTurns: names((until) => until < today && until >= back),
  }
}
