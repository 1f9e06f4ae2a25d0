import type { DataSource } from 'typeorm'
import type { Account } from '@shared/session/account'
import { hashPassword, passwordFits } from '../../adapters/passwords'
import type { Context } from '../../context'
import { Membership } from '../../database/entities/Membership'
import { Person } from '../../database/entities/Person'
import { BadInput, NotFound } from '../../http/problem'
import { presentAccount } from './session.presenter'
import { setPassword } from './passwordReset.service'

/** What the page You shows of a person. */
export async function describeAccount(db: DataSource, personId: string): Promise<Account> {
  const person = await db.getRepository(Person).findOneByOrFail({ id: personId })
  const memberships = await db.getRepository(Membership).find({
    where: { personId },
    relations: { team: true },
  })
  return presentAccount(person, memberships)
}

/**
 * Changes one's own password; every other session ends.
 * @throws BadInput when the old one does not fit
 */
export async function changePassword(
  { db, clock }: Pick<Context, 'db' | 'clock'>,
  options: { personId: string; session: string; old: string; password: string },
): Promise<void> {
  const person = await db.getRepository(Person).findOneByOrFail({ id: options.personId })
  if (!(await passwordFits(person.passwordHash, options.old)))
    throw new BadInput([{ field: 'old', message: 'This is not your password now. Check it.' }])
  const passwordHash = await hashPassword(options.password)
  await db.transaction((manager) =>
    setPassword(manager, {
      personId: person.id,
      passwordHash,
      now: clock(),
      butSession: options.session,
    }),
  )
}

/** Whether sheets of a team come by mail. @throws NotFound when the person is not of that team */
export async function setMailChoice(
  db: DataSource,
  { personId, teamId, mail }: { personId: string; teamId: string; mail: boolean },
): Promise<void> {
  const { affected } = await db.getRepository(Membership).update({ personId, teamId }, { mail })
  if (affected !== 1) throw new NotFound('team', '')
}
