import { randomBytes } from 'node:crypto'
import { mkdir, readFile, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { In } from 'typeorm'
import { systemClock } from './adapters/clock'
import { lockFolder } from './adapters/folderLock'
import { createLog } from './adapters/log'
import { smtpTransport } from './adapters/mail/smtp'
import { diskStillFiles } from './adapters/stillFiles'
import type { Config } from './config'
import type { Context } from './context'
import { openDatabase } from './database/dataSource'
import { DEMO_SIGN_INS } from './database/demo/people'
import { Person } from './database/entities/Person'
import { firstRunToken } from './features/people/firstCoach.service'
import { fillDemo } from './features/demo/fillDemo.service'

/** The secret of the settings, or one made once and kept beside the data, readable by its owner only. */
async function sessionSecret(config: Config): Promise<string> {
  if (config.sessionSecret) return config.sessionSecret
  const file = join(config.dataDir, 'session-secret')
  const kept = await readFile(file, 'utf8').catch(() => null)
  if (kept) return kept
  const made = randomBytes(32).toString('hex')
  await writeFile(file, made, { mode: 0o600 })
  return made
}

export interface Booted {
  context: Context
  /** Whether the invented club is in the database: its sign-ins are told only then. */
  demoIsIn: boolean
  /** Closes the database and lets go of the data folder. */
  close: () => Promise<void>
}

/**
 * Opens everything that the app stands on; fills an empty database with the demo where that is wanted.
 * @throws FolderInUse when another server has the data folder, or a restore is under way there.
 */
export async function boot(config: Config): Promise<Booted> {
  await mkdir(config.dataDir, { recursive: true })
  const letGo = lockFolder(config.dataDir)
  try {
    const { context, demoIsIn } = await open(config)
    const close = async () => {
      context.mail?.close()
      await context.db.destroy()
      letGo()
    }
    return { context, demoIsIn, close }
  } catch (error) {
    letGo()
    throw error
  }
}

async function open(config: Config): Promise<Omit<Booted, 'close'>> {
  const context: Context = {
    config,
    db: await openDatabase(join(config.dataDir, 'overtop.sqlite')),
    clock: systemClock,
    stillFiles: diskStillFiles(config.dataDir),
    mail: smtpTransport(config),
    log: createLog(config.logLevel),
    sessionSecret: await sessionSecret(config),
  }
  if (config.demo) await fillDemo(context)
  context.firstRunToken = await firstRunToken(context.db)
  const email = In(DEMO_SIGN_INS.map((person) => person.email))
  return { context, demoIsIn: await context.db.getRepository(Person).existsBy({ email }) }
}
