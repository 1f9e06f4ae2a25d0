import { LIMITS } from '@shared/limits'
import type { LetterBody } from '../../adapters/mail/letter'

/** The letter with a link to a new password. @param url with the secret in its fragment, which no server logs */
export const passwordLetter = (name: string, url: string): { subject: string; body: LetterBody } => ({
  subject: 'A new password for Overtop',
  body: {
    blocks: [
      { kind: 'heading', text: 'A new password' },
      { kind: 'paragraph', text: `Hello ${name.split(' ')[0] ?? name}.` },
      {
        kind: 'paragraph',
        text: `Somebody asked for a new password for this address. If it was you, choose one here. The link works once, for ${LIMITS.resetMinutes} minutes.`,
      },
      { kind: 'button', label: 'Choose a new password', url },
      {
        kind: 'paragraph',
        text: 'If it was not you, do nothing: your password stays as it is, and nobody else has this link.',
      },
    ],
    why: 'You get this because your address has an account on Overtop and somebody typed it on the page “Forgotten password”. It comes only then. If that happens often, tell your head coach.',
  },
})
