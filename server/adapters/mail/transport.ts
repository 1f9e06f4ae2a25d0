/** One letter on its way to one address. */
export interface Letter {
  /** The mail's own id; the Message-ID is made from it, so that the same letter twice can be told as one. */
  id: string
  recipient: string
  subject: string
  text: string
  html: string
  files: readonly LetterFile[]
}

export interface LetterFile {
  name: string
  contentType: string
  content: Buffer
}

/** What carries letters away; behind it stands a mail server. */
export interface MailTransport {
  /** Resolves when the mail server has taken the letter. @throws MailTrouble */
  send: (letter: Letter) => Promise<void>
  close: () => void
}

/**
 * Why a letter did not leave, in our own words and with a remedy.
 * - `refused`: this letter will never be taken; trying again is no use.
 * - `letter`: this letter may be taken later.
 * - `server`: no letter leaves at present.
 */
export class MailTrouble extends Error {
  constructor(
    words: string,
    readonly reach: 'refused' | 'letter' | 'server',
    options?: ErrorOptions,
  ) {
    super(words, options)
  }
}
