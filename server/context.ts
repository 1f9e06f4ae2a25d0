import type { Logger } from 'pino'
import type { DataSource } from 'typeorm'
import type { Clock } from './adapters/clock'
import type { MailTransport } from './adapters/mail/transport'
import type { StillFiles } from './adapters/stillFiles'
import type { Config } from './config'

/** What the app is built from; production and tests build the same app from other values. */
export interface Context {
  config: Config
  db: DataSource
  clock: Clock
  stillFiles: StillFiles
  /** Null without a mail server: letters are kept for the staff to hand on. */
  mail: MailTransport | null
  log: Logger
  /** Signs the session cookie. */
  sessionSecret: string
  /** Opens the first-run page, while there is no team; printed when the server starts. */
  firstRunToken?: string | null
}
