import { randomUUID } from 'node:crypto'
import { In, type EntityManager } from 'typeorm'
import type { LettersBody, LettersMade } from '@shared/sheets/handOut'
import { pressDrawing } from '@shared/sheets/drawings'
import { readBy } from '@shared/sheets/reader'
import { settingsOf, type TeamSettings } from '@shared/team/settings'
import { scenePng } from '../../adapters/pdf/scenePng'
import type { Context } from '../../context'
import { Copy } from '../../database/entities/Copy'
import type { Mail } from '../../database/entities/Mail'
import { Membership } from '../../database/entities/Membership'
import type { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { Conflict, NotFound } from '../../http/problem'
import { pokeMail } from '../mail/carrier'
import { linkTo } from '../mail/linkTo'
import { queueMail } from '../mail/queueMail'
import { coachKey, listCopies, playersNamed } from './copies.service'
import { sheetLetter, subjectOf, type LetterReader, type SheetLetter } from './letterWords'
import { pageOfSheet, type WholeSheet } from './sheets.presenter'
import { getSheet } from './sheets.service'

/** px that the drawing of a letter is shown at. */
const DRAWN = 532

interface Addressed {
  onceKey: string
  recipient: string
  reader: LetterReader
  way: 'mail' | 'guardian'
  squadPlayerId: string | null
}

/**
 * Queues a sheet's letters and hands back all of them, old and new. A player's own account comes first, then her
 * guardian's address; who has neither is named. Nobody gets the same sheet twice.
 * @throws NotFound for a player or coach of another team; Conflict when the sheet was called back
 */
export async function writeLetters(
  context: Context,
  options: { teamId: string; sheetId: string; body: LettersBody; now: Date },
): Promise<LettersMade> {
  const { teamId, sheetId, body, now } = options
  const drawing = await drawingOf(context.db.manager, teamId, sheetId)
  const made = await context.db.transaction(async (manager) => {
    const whole = await getSheet(manager, teamId, sheetId)
    if (whole.sheet.recalledAt !== null)
      throw new Conflict('This sheet was called back. Send the newest one instead.')
    const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
    const settings = settingsOf(team.settings)
    const players = await playersNamed(manager, teamId, body.players)
    const accounts = await accountsOf(manager, teamId, players)
    const named = players.map((player) => ({ player, to: addressOf(sheetId, player, accounts, settings) }))
    const coaches = await coachesNamed(manager, teamId, sheetId, body.members)
    const letter: SheetLetter = {
      teamName: team.name,
      squadName: team.squadName,
      url: linkTo(context.config, `/t/${teamId}/sheets/${sheetId}`),
      drawing,
    }
    const addressed = [...named.map(({ to }) => to), ...coaches].filter((to) => to !== null)
    for (const to of addressed) await writeOne(manager, { whole, letter, to, settings, now })
    return {
      rows: (await listCopies(manager, teamId, sheetId)).filter(({ way }) => way !== 'paper'),
      without: named
        .filter(({ to }) => to === null)
        .map(({ player }) => ({ squadPlayerId: player.id, jersey: player.jersey })),
    }
  })
  pokeMail(context)
  return { ...made, total: made.rows.length }
}

/** Drawn before the transaction, which must not wait for a picture. */
async function drawingOf(manager: EntityManager, teamId: string, sheetId: string): Promise<Buffer> {
  const { content } = await getSheet(manager, teamId, sheetId)
  return scenePng(pressDrawing(content, { width: DRAWN, labels: 'letters', medium: 'paper' }), DRAWN)
}

/** Accounts by squad player; only those who take letters. */
async function accountsOf(
  manager: EntityManager,
  teamId: string,
  players: readonly SquadPlayer[],
): Promise<Map<string, Membership>> {
  const members = await manager.getRepository(Membership).find({
    where: { teamId, mail: true, squadPlayerId: In(players.map(({ id }) => id)) },
    relations: { person: true },
  })
  return new Map(members.map((member) => [member.squadPlayerId ?? '', member]))
}

function addressOf(
  sheetId: string,
  player: SquadPlayer,
  accounts: ReadonlyMap<string, Membership>,
  settings: TeamSettings,
): Addressed | null {
  // One key for both ways: an account made later does not bring the same sheet again.
  const one = { onceKey: `sheet:${sheetId}:player:${player.id}`, squadPlayerId: player.id }
  const own = accounts.get(player.id)?.person?.email
  if (own !== undefined)
    return { ...one, recipient: own, way: 'mail', reader: { kind: 'player', firstName: player.firstName } }
  if (player.guardianEmail === null) return null
  const reader = { kind: 'guardian', jersey: player.jersey, attached: settings.attachSheet } as const
  return { ...one, recipient: player.guardianEmail, way: 'guardian', reader }
}

/** Coaches by membership who take letters; players have letters of their own. @throws NotFound */
async function coachesNamed(
  manager: EntityManager,
  teamId: string,
  sheetId: string,
  ids: readonly string[],
): Promise<Addressed[]> {
  const asked = [...new Set(ids)]
  const members = await manager
    .getRepository(Membership)
    .find({ where: { teamId, id: In(asked) }, relations: { person: true } })
  if (members.length < asked.length) throw new NotFound('person')
  return members.flatMap(({ id, role, mail, person }): Addressed[] =>
    person && mail && role !== 'player'
      ? [
          {
            onceKey: coachKey(sheetId, id),
            recipient: person.email,
            way: 'mail',
            squadPlayerId: null,
            reader: { kind: 'coach', name: person.name.split(' ')[0] ?? person.name },
          },
        ]
      : [],
  )
}

/** One letter and its row among the copies; both or, for a repeat, neither. */
async function writeOne(
  manager: EntityManager,
  options: { whole: WholeSheet; letter: SheetLetter; to: Addressed; settings: TeamSettings; now: Date },
): Promise<void> {
  const { whole, letter, to, settings, now } = options
  const { id: sheetId, teamId } = whole.sheet
  const page = pageOfSheet(whole, null)
  const attached = to.way === 'guardian' && settings.attachSheet
  const mail: Mail = await queueMail(manager, {
    teamId,
    kind: 'sheet',
    onceKey: to.onceKey,
    aboutId: sheetId,
    recipient: to.recipient,
    subject: subjectOf(page),
    body: sheetLetter(readBy(page, to.squadPlayerId), to.reader, letter),
    attachment: attached ? { kind: 'sheet', sheetId, squadPlayerId: to.squadPlayerId, paper: 'a4' } : null,
    now,
  })
  const copies = manager.getRepository(Copy)
  if (await copies.existsBy({ mailId: mail.id })) return
  const stamp = now.toISOString()
  await copies.insert({
    id: randomUUID(),
    teamId,
    sheetId,
    squadPlayerId: to.squadPlayerId,
    number: null,
    way: to.way,
    outAt: null,
    backAt: null,
    mailId: mail.id,
    version: 1,
    createdAt: stamp,
    updatedAt: stamp,
    deletedAt: null,
  })
}
