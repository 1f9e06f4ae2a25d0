import { In, type EntityManager } from 'typeorm'
import type { Recalled } from '@shared/sheets/handOut'
import { readBy } from '@shared/sheets/reader'
import type { Context } from '../../context'
import { Copy } from '../../database/entities/Copy'
import { Mail } from '../../database/entities/Mail'
import { Sheet } from '../../database/entities/Sheet'
import { Team } from '../../database/entities/Team'
import { sheetWhen } from '@shared/sheets/when'
import { pokeMail } from '../mail/carrier'
import { linkTo } from '../mail/linkTo'
import { queueMail, withdrawMailAbout } from '../mail/queueMail'
import { listCopies } from './copies.service'
import { pageOfSheet, type WholeSheet } from './sheets.presenter'
import { getSheet } from './sheets.service'

/**
 * Calls a sheet back for good: readers are told, letters that have not left are withdrawn, who got one is written
 * to, and the papers that are out are listed. The same again changes nothing.
 * @throws NotFound
 */
export async function recallSheet(
  context: Context,
  options: { teamId: string; sheetId: string; now: Date },
): Promise<Recalled> {
  const { teamId, sheetId, now } = options
  const recalled = await context.db.transaction(async (manager) => {
    const whole = await getSheet(manager, teamId, sheetId)
    const recalledAt = whole.sheet.recalledAt ?? now.toISOString()
    let withdrawn = 0
    if (whole.sheet.recalledAt === null) {
      await manager.getRepository(Sheet).update({ id: sheetId }, { recalledAt })
      withdrawn = await withdrawMailAbout(manager, sheetId, 'sheet')
      await writeToReaders(context, manager, whole, now)
    }
    const copies = await listCopies(manager, teamId, sheetId)
    return { recalledAt, out: copies.filter(({ place }) => place === 'out'), withdrawn }
  })
  pokeMail(context)
  return recalled
}

/** A word to everybody whose letter has left. */
async function writeToReaders(
  context: Context,
  manager: EntityManager,
  whole: WholeSheet,
  now: Date,
): Promise<void> {
  const { id: sheetId, teamId } = whole.sheet
  const copies = await manager.getRepository(Copy).findBy({ sheetId, way: In(['mail', 'guardian']) })
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const { content } = readBy(pageOfSheet(whole, null), null)
  const when = sheetWhen(content.tipOff, team.timeZone, content.place)
  for (const copy of copies) {
    const mail = copy.mailId && (await manager.getRepository(Mail).findOneBy({ id: copy.mailId }))
    if (!mail || mail.state === 'withdrawn') continue
    await queueMail(manager, {
      teamId,
      kind: 'sheet-recalled',
      onceKey: `recalled:${sheetId}:${copy.id}`,
      aboutId: sheetId,
      recipient: mail.recipient,
      subject: `${content.opponentName}: the sheet is called back`,
      body: {
        blocks: [
          { kind: 'heading', text: 'This one is called back.' },
          {
            kind: 'paragraph',
            text: `The sheet for ${content.opponentName}, ${when}, no longer holds. ${whole.newest ? `Version ${whole.newest.planNumber} took its place.` : 'Wait for the next one.'} Bring back any paper that you have of it.`,
          },
          ...(whole.newest && copy.way === 'mail'
            ? [
                {
                  kind: 'button' as const,
                  label: 'Open the newest one',
                  url: linkTo(context.config, `/t/${teamId}/sheets/${whole.newest.id}`),
                },
              ]
            : []),
        ],
        why: `You get this because the sheet was sent to this address by ${team.name} ${team.squadName}. To stop these letters, tell the coach.`,
      },
      now,
    })
  }
}
