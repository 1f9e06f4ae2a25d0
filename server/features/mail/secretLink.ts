import { createHash, createHmac } from 'node:crypto'

/**
 * Stands in a letter's words where the secret of its link goes. The words lie in the database until the letter
 * leaves; the secret is put in on its way out, so that it lies nowhere.
 */
export const SECRET_PLACE = 'SECRET-IS-PUT-IN-WHEN-THE-LETTER-LEAVES'

/**
 * The secret of one link, always the same for the same row: made from the server's own secret, so that nothing
 * has to keep it. 256 bits in hex: mail readers take a hyphen at the end of an address as no part of it.
 * @param purpose a letter's kind
 * @param id of the row that the link opens (an invitation, a reset): a letter's `aboutId`
 */
export const secretOf = (serverSecret: string, purpose: string, id: string): string =>
  createHmac('sha256', serverSecret).update(`${purpose}:${id}`).digest('hex')

/** What is stored of a secret: its SHA-256. It is long and random, so no slow hash is needed. */
export const digestOf = (secret: string): string => createHash('sha256').update(secret).digest('hex')

/** Words with the secret put into their place; words without a place come back as they are. */
export const withSecret = (
  words: string,
  serverSecret: string,
  { kind, aboutId }: { kind: string; aboutId: string | null },
): string =>
  aboutId === null ? words : words.replaceAll(SECRET_PLACE, () => secretOf(serverSecret, kind, aboutId))
