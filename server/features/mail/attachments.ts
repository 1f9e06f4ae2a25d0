import type { MailAttachment } from '@shared/mail/schemas'
import type { LetterFile } from '../../adapters/mail/transport'
import type { Context } from '../../context'

/** Draws what goes with a letter, when it leaves. @throws NotFound when what is to be drawn is gone */
export type DrawAttachment = (
  context: Context,
  teamId: string,
  attachment: MailAttachment,
) => Promise<LetterFile>

const drawers = new Map<MailAttachment['kind'], DrawAttachment>()

/** Said once by the feature that owns the paper, where its routes are made. */
export function drawAttachmentsOf(kind: MailAttachment['kind'], draw: DrawAttachment): void {
  drawers.set(kind, draw)
}

/** @throws Error when nobody said how this kind is drawn */
export async function drawAttachment(
  context: Context,
  teamId: string,
  attachment: MailAttachment,
): Promise<LetterFile> {
  const draw = drawers.get(attachment.kind)
  if (!draw) throw new Error(`nobody draws attachments of the kind ${attachment.kind}`)
  return draw(context, teamId, attachment)
}
