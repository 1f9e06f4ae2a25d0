import { In, type DataSource, type EntityManager } from 'typeorm'
import { COPIES, type CopiesBody, type CopyChange, type CopyRow } from '@shared/sheets/handOut'
import { Copy } from '../../database/entities/Copy'
import { Mail } from '../../database/entities/Mail'
import { Membership } from '../../database/entities/Membership'
import { Sheet } from '../../database/entities/Sheet'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { findInTeam } from '../../database/findInTeam'
import { recordChange } from '../../database/history'
import { Conflict, NeedsIfMatch, NotFound, StaleVersion } from '../../http/problem'
import { findSheet } from './findSheet'
import { placeOf, presentCopy } from './copies.presenter'

/** Rows with what stands beside them. */
export async function presentCopies(manager: EntityManager, rows: readonly Copy[]): Promise<CopyRow[]> {
  const ids = (key: 'squadPlayerId' | 'mailId') =>
    In([...new Set(rows.map((row) => row[key]).filter((id) => id !== null))])
  const players = await manager.getRepository(SquadPlayer).findBy({ id: ids('squadPlayerId') })
  const mails = await manager.getRepository(Mail).findBy({ id: ids('mailId') })
  const playerOf = new Map(players.map((player) => [player.id, player]))
  const mailOf = new Map(mails.map((mail) => [mail.id, mail]))
  const coaches = await coachNames(manager, mails)
  return rows.map((row) => {
    const mail = row.mailId === null ? null : (mailOf.get(row.mailId) ?? null)
    return presentCopy(row, {
      player: row.squadPlayerId === null ? null : (playerOf.get(row.squadPlayerId) ?? null),
      coach: mail === null ? null : (coaches.get(mail.onceKey) ?? null),
      mail,
    })
  })
}

/** Names a sheet's letter to a coach, so that the same coach gets it once. */
export const coachKey = (sheetId: string, membershipId: string) => `sheet:${sheetId}:member:${membershipId}`

async function coachNames(manager: EntityManager, mails: readonly Mail[]): Promise<Map<string, string>> {
  const keys = mails.map(({ onceKey }) => onceKey).filter((key) => key.includes(':member:'))
  if (keys.length === 0) return new Map()
  const members = await manager.getRepository(Membership).find({
    where: { id: In(keys.map((key) => key.split(':member:')[1] ?? '')) },
    relations: { person: true },
  })
  return new Map(
    keys.flatMap((key) => {
      const name = members.find(({ id }) => key.endsWith(id))?.person?.name
      return name === undefined ? [] : [[key, name]]
    }),
  )
}

/** Papers by number, then letters as they were written. @throws NotFound */
export async function listCopies(
  manager: EntityManager,
  teamId: string,
  sheetId: string,
): Promise<CopyRow[]> {
  await findSheet(manager, teamId, sheetId)
  const rows = await manager.getRepository(Copy).findBy({ sheetId })
  rows.sort((a, b) => (a.number ?? 1000) - (b.number ?? 1000) || a.createdAt.localeCompare(b.createdAt))
  return presentCopies(manager, rows)
}

/** The players that are named, all of the team. @throws NotFound */
export async function playersNamed(
  manager: EntityManager,
  teamId: string,
  ids: readonly string[],
): Promise<SquadPlayer[]> {
  const asked = [...new Set(ids)]
  const rows = await manager.getRepository(SquadPlayer).findBy({ teamId, id: In(asked) })
  const present = rows.filter(({ deletedAt }) => deletedAt === null)
  if (present.length < asked.length) throw new NotFound('player')
  return present
}

/**
 * Makes numbered papers: from 1 within a sheet, never the same number twice. Ids that are there already stay as
 * they are, so that a repeat makes nothing new.
 * @throws NotFound, Conflict when a copy is another's or the sheet was called back
 */
export function makeCopies(
  db: DataSource,
  options: { teamId: string; sheetId: string; body: CopiesBody; now: Date; by: string },
): Promise<CopyRow[]> {
  const { teamId, sheetId, body, now, by } = options
  return db.transaction(async (manager) => {
    const { sheet } = await findSheet(manager, teamId, sheetId)
    const copies = manager.getRepository(Copy)
    const there = await copies.findBy({ id: In(body.copies.map(({ id }) => id)) })
    for (const copy of there) {
      if (copy.teamId !== teamId) throw new NotFound('copy')
      checkSame(copy, sheetId, body)
    }
    const news = body.copies.filter(({ id }) => !there.some((copy) => copy.id === id))
    if (news.length > 0 && sheet.recalledAt !== null)
      throw new Conflict('This sheet was called back. Make copies of the newest one.')
    await playersNamed(
      manager,
      teamId,
      news.map(({ squadPlayerId }) => squadPlayerId).filter((id) => id !== null),
    )
    const last = await lastNumber(manager, sheetId)
    if (last + news.length > COPIES.ofASheet)
      throw new Conflict(
        `A sheet has ${COPIES.ofASheet} copies at most. Bring some back and give those out again.`,
      )
    const stamp = now.toISOString()
    for (const [index, { id, squadPlayerId }] of news.entries()) {
      await copies.insert({
        id,
        teamId,
        sheetId,
        squadPlayerId,
        number: last + index + 1,
        way: 'paper',
        outAt: null,
        backAt: null,
        mailId: null,
        version: 1,
        createdAt: stamp,
        updatedAt: stamp,
        deletedAt: null,
      })
      await recordChange(manager, Copy, { teamId, rowId: id, action: 'made', by, now })
    }
    return listCopies(manager, teamId, sheetId)
  })
}

/** The highest number that a paper of the sheet has or had; 0 before the first. */
export async function lastNumber(manager: EntityManager, sheetId: string): Promise<number> {
  const [row]: { last: number | null }[] = await manager.query(
    'SELECT max("number") AS last FROM "copies" WHERE "sheetId" = ?',
    [sheetId],
  )
  return row?.last ?? 0
}

function checkSame(copy: Copy, sheetId: string, body: CopiesBody): void {
  const asked = body.copies.find(({ id }) => id === copy.id)
  if (copy.sheetId !== sheetId || copy.way !== 'paper' || copy.squadPlayerId !== asked?.squadPlayerId)
    throw new Conflict('Another copy has this id already. Use a new one.')
}

/**
 * Gives a paper out, says to whom, takes it back, or puts it in the bag again.
 * @throws NotFound, NeedsIfMatch, StaleVersion, Conflict
 */
export function moveCopy(
  db: DataSource,
  options: { teamId: string; id: string; ifMatch: number | null; now: Date; by: string } & CopyChange,
): Promise<CopyRow> {
  const { teamId, id, place, ifMatch, now, by } = options
  return db.transaction(async (manager) => {
    const copy = await findInTeam(manager, Copy, teamId, id, 'copy')
    await findSheet(manager, teamId, copy.sheetId)
    const shown = async () => (await presentCopies(manager, [copy]))[0] as CopyRow
    if (ifMatch === null) throw new NeedsIfMatch()
    if (ifMatch !== copy.version) throw new StaleVersion(await shown(), copy.version)
    const from = placeOf(copy)
    if (copy.way !== 'paper') throw new Conflict('A letter is not given out by hand.')
    const had = copy.squadPlayerId
    const has = options.squadPlayerId === undefined ? had : options.squadPlayerId
    if (has !== null && has !== had) await playersNamed(manager, teamId, [has])
    if (from === place && has === had) return shown()
    if (place === 'out') await checkInForce(manager, copy)
    const stamp = now.toISOString()
    copy.squadPlayerId = has
    copy.outAt = place === 'bag' ? null : place === 'out' ? stamp : copy.outAt
    copy.backAt = place === 'back' ? stamp : null
    copy.version += 1
    copy.updatedAt = stamp
    const { squadPlayerId, outAt, backAt, version, updatedAt } = copy
    await manager.getRepository(Copy).update({ id }, { squadPlayerId, outAt, backAt, version, updatedAt })
    const fields = [
      ...(from === place ? [] : [{ field: 'place', from, to: place }]),
      ...(had === has ? [] : [{ field: 'squadPlayerId', from: had, to: has }]),
    ]
    await recordChange(manager, Copy, { teamId, rowId: id, action: 'changed', by, now, fields })
    return shown()
  })
}

async function checkInForce(manager: EntityManager, { sheetId }: Copy): Promise<void> {
  const sheet = await manager.getRepository(Sheet).findOneByOrFail({ id: sheetId })
  if (sheet.recalledAt !== null)
    throw new Conflict('This sheet was called back. Give out the newest one instead.')
}
