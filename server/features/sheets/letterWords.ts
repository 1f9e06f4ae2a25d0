import type { LetterBlock, LetterBody } from '../../adapters/mail/letter'
import { pressWords } from '@shared/sheets/drawings'
import { counterShown } from '@shared/sheets/reader'
import { sheetContent } from '@shared/sheets/content'
import type { SheetView } from '@shared/sheets/schemas'
import { sheetWhen } from '@shared/sheets/when'

type Page = Omit<SheetView, 'budget'>

/** Whom a letter speaks to. */
export type LetterReader =
  | { kind: 'player'; firstName: string }
  | { kind: 'guardian'; jersey: number; attached: boolean }
  | { kind: 'coach'; name: string }

export interface SheetLetter {
  teamName: string
  squadName: string
  /** Whose address on the team's pages: where a player reads it. */
  url: string
  drawing: Buffer
}

/** "Port Selby Gulls on Friday: two minutes, please" */
export function subjectOf({ content, timeZone }: Page): string {
  const weekday = sheetWhen(content.tipOff, timeZone, content.place).split(' ')[0] ?? ''
  return `${content.opponentName} on ${weekday}: two minutes, please`
}

/**
 * The letter that goes with a sheet. To a guardian the player is a shirt number, never a name; nobody's last
 * name stands in any of them.
 */
export function sheetLetter(page: Page, reader: LetterReader, letter: SheetLetter): LetterBody {
  const { content, timeZone } = page
  const said = sheetContent(page)
  const headings = (['their', 'our'] as const).flatMap((ink): LetterBlock[] => {
    const line = content.press.lines.find((one) => one.ink === ink)
    return line ? [{ kind: 'heading', text: line.text, ink }] : []
  })
  return {
    blocks: [
      ...(headings.length > 0
        ? headings
        : [{ kind: 'heading', text: content.opponentName, ink: 'their' } as const]),
      { kind: 'paragraph', text: `${hello(reader)} ${sheetWhen(content.tipOff, timeZone, content.place)}.` },
      { kind: 'drawing', png: letter.drawing, alternative: pressWords(content) },
      {
        kind: 'rows',
        rows: content.press.lines.map(({ letter: mark, text, k, n, ink }) => ({
          mark,
          text,
          value: `${k} of ${n}`,
          ink,
        })),
      },
      ...(said.reader.kind === 'one' ? [{ kind: 'paragraph', text: jobOf(said, page) } as const] : []),
      ...closing(reader, letter.url),
    ],
    why: whyOf(reader, letter),
  }
}

const hello = (reader: LetterReader): string => {
  if (reader.kind === 'player') return `Hello ${reader.firstName}. This is the next game on one court:`
  if (reader.kind === 'coach') return `Hello ${reader.name}. This is the sheet that the players get:`
  return `For number ${reader.jersey}. This is the next game on one court:`
}

function jobOf(said: ReturnType<typeof sheetContent>, { content }: Page): string {
  if (said.reader.kind !== 'one') return ''
  const on = counterShown(content, said.way).name
  const [first = ''] = said.reader.jobs
  return `You are ${said.reader.role} in ${on}. ${first}`.trim()
}

function closing(reader: LetterReader, url: string): LetterBlock[] {
  if (reader.kind === 'guardian')
    return [
      {
        kind: 'paragraph',
        text: reader.attached
          ? 'The page is attached. Please hand it on, and do not pass it further.'
          : 'Please hand this on. The page itself is given out at practice, on paper with a number.',
      },
    ]
  return [
    { kind: 'button', label: reader.kind === 'player' ? 'See your job' : 'Open the sheet', url },
    { kind: 'paragraph', text: 'The page opens once you have signed in.' },
  ]
}

function whyOf(reader: LetterReader, { teamName, squadName }: SheetLetter): string {
  const team = `${teamName} ${squadName}`
  if (reader.kind === 'player')
    return `You get this because you play for ${team}. To stop these letters, tell your coach.`
  if (reader.kind === 'coach')
    return `You get this because you are on the staff of ${team}. To stop these letters, tell your head coach.`
  return `You get this because this is the address that ${team} has for number ${reader.jersey}. To stop these letters, tell the coach.`
}
