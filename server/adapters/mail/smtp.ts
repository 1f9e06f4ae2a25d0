import { createTransport } from 'nodemailer'
import type { Config } from '../../config'
import { smtpTrouble } from './smtpTrouble'
import type { MailTransport } from './transport'

/** Milliseconds; a server that is slower than this is taken as away, and the letter is tried again. */
const CONNECT_MS = 15_000
const SILENT_MS = 45_000

const LOOPBACK = /^(localhost|127(\.\d+){3}|\[::1\])$/

/**
 * Where a MAIL_URL leads. smtps:// speaks TLS from the first byte; smtp:// turns to TLS by STARTTLS where the
 * server offers it, and must before a password goes to another machine.
 */
export function smtpOptions(mailUrl: string) {
  const url = new URL(mailUrl)
  const secure = url.protocol === 'smtps:'
  const user = decodeURIComponent(url.username)
  const pass = decodeURIComponent(url.password)
  return {
    host: url.hostname.replace(/^\[|\]$/g, ''),
    port: url.port === '' ? (secure ? 465 : 587) : Number(url.port),
    secure,
    requireTLS: !secure && user !== '' && !LOOPBACK.test(url.hostname),
    ...(user === '' ? {} : { auth: { user, pass } }),
  }
}

const addressOf = (sender: string): string => (/<([^<>]+)>/.exec(sender)?.[1] ?? sender).trim()

/** Letters by SMTP as the settings say; null where no mail server is set. */
export function smtpTransport({
  mailUrl,
  mailFrom,
}: Pick<Config, 'mailUrl' | 'mailFrom'>): MailTransport | null {
  if (mailUrl === null || mailFrom === null) return null
  const domain = addressOf(mailFrom).split('@').pop() ?? 'overtop.invalid'
  const smtp = createTransport({
    ...smtpOptions(mailUrl),
    connectionTimeout: CONNECT_MS,
    greetingTimeout: CONNECT_MS,
    socketTimeout: SILENT_MS,
    dnsTimeout: CONNECT_MS,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  return {
    send: async ({ id, recipient, subject, text, html, files }) => {
      await smtp
        .sendMail({
          from: mailFrom,
          to: { name: '', address: recipient },
          subject,
          text,
          html,
          // Drawings stand in the HTML as data; many readers show them only as parts of the letter.
          attachDataUrls: true,
          messageId: `<${id}@${domain}>`,
          headers: { 'Auto-Submitted': 'auto-generated' },
          attachments: files.map(({ name, contentType, content }) => ({
            filename: name,
            contentType,
            content,
          })),
        })
        .catch((error: unknown) => {
          throw smtpTrouble(error)
        })
    },
    close: () => smtp.close(),
  }
}
