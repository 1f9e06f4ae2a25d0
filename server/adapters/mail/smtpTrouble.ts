import { MailTrouble } from './transport'

/** What Nodemailer puts on its errors. Its English message is for the log, never for a coach. */
interface SmtpError {
  code?: unknown
  responseCode?: unknown
  command?: unknown
}

const NOT_REACHED = 'The mail server could not be reached. Check MAIL_URL and whether it is up.'

/** Words for errors before the server has said anything about the letter. */
const BY_CODE: Record<string, string> = {
  EAUTH: 'The mail server does not take our user name and password. Check them in MAIL_URL.',
  ENOAUTH: 'The mail server asks for a user name and password. Put them into MAIL_URL.',
  ETLS: 'No safe connection to the mail server could be made. Check MAIL_URL and the server’s certificate.',
  EDNS: 'The mail server’s name is not known. Check it in MAIL_URL.',
  ENOTFOUND: 'The mail server’s name is not known. Check it in MAIL_URL.',
  EAI_AGAIN: 'The mail server’s name could not be looked up just now. It is tried again.',
  ECONNREFUSED: NOT_REACHED,
  ECONNRESET: 'The mail server hung up. It is tried again.',
  ECONNECTION: 'The mail server hung up. It is tried again.',
  ESOCKET: NOT_REACHED,
  ETIMEDOUT: 'The mail server took too long to answer. It is tried again.',
  EPROTOCOL: 'What answers at MAIL_URL does not speak as a mail server does. Check the port.',
}

/** Words for the server's refusals, by its answer (RFC 5321 section 4.2.3). */
const BY_ANSWER: Record<number, string> = {
  421: 'The mail server is closing just now. It is tried again.',
  450: 'The mailbox is busy or the server makes us wait. It is tried again.',
  451: 'The mail server had trouble of its own. It is tried again.',
  452: 'The mail server has no room just now. It is tried again.',
  530: 'The mail server asks for a user name and password. Put them into MAIL_URL.',
  550: 'There is no such mailbox, or it does not take mail from us. Check the address.',
  551: 'The mailbox has moved. Ask for the new address.',
  552: 'The mailbox is full, or the letter is too large for it. Ask for another address.',
  553: 'The mail server does not take this address. Check how it is written.',
  554: 'The mail server refused the letter. Check the address and MAIL_FROM.',
}

/** Commands in which an answer is about this letter; before them it is about us. */
const ABOUT_THE_LETTER = new Set(['MAIL FROM', 'RCPT TO', 'DATA'])

/** An error of the SMTP client as trouble in our own words. */
export function smtpTrouble(error: unknown): MailTrouble {
  const { code, responseCode, command } = (
    typeof error === 'object' && error !== null ? error : {}
  ) as SmtpError
  // The client's error carries addresses; the log needs where it stopped and what was answered, nobody's address.
  const cause = { cause: typeof code === 'string' ? { code, responseCode, command } : error }
  if (typeof responseCode === 'number' && typeof command === 'string' && ABOUT_THE_LETTER.has(command)) {
    const permanent = responseCode >= 500
    const words = permanent
      ? (BY_ANSWER[responseCode] ?? 'The mail server refused the letter. Check the address and MAIL_FROM.')
      : (BY_ANSWER[responseCode] ?? 'The mail server does not take the letter just now. It is tried again.')
    const askedForPassword = responseCode === 530
    return new MailTrouble(words, askedForPassword ? 'server' : permanent ? 'refused' : 'letter', cause)
  }
  if (code === 'EENVELOPE')
    return new MailTrouble('This is not an address that mail can go to. Check it.', 'refused', cause)
  if (code === 'EMESSAGE')
    return new MailTrouble('The letter is too large for the mail server.', 'refused', cause)
  const known = typeof code === 'string' ? BY_CODE[code] : undefined
  return new MailTrouble(known ?? 'The letter did not leave. It is tried again.', 'server', cause)
}
