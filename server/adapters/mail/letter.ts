/**
 * What a letter says, as plain blocks. Nothing in it is markup: every text is escaped when it is rendered. The
 * same blocks become the plain and the HTML part, so that both say the same.
 */
export interface LetterBody {
  blocks: readonly LetterBlock[]
  /** One sentence: why the reader gets this and how to stop it. Stands small at the foot. */
  why: string
}

export type LetterBlock =
  /** `ink`: what they do is `their`, what we do is `our`; left out it is graphite. */
  | { kind: 'heading'; text: string; ink?: 'their' | 'our' }
  | { kind: 'paragraph'; text: string }
  /** At most one in a letter. `url` is absolute (`linkTo`). */
  | { kind: 'button'; label: string; url: string }
  /** Ruled lines: a mark of one or two letters, words, and a value at the end. */
  | { kind: 'rows'; rows: readonly LetterRow[] }
  /** A PNG at twice the size it is shown at, and the words that stand for it. */
  | { kind: 'drawing'; png: Buffer; alternative: string }

export interface LetterRow {
  mark?: string
  text: string
  value?: string
  ink?: 'their' | 'our'
}

/** Both parts of a letter, ready to leave. */
export interface RenderedLetter {
  text: string
  html: string
}

const INK = { their: '#b93411', our: '#0b5566', graphite: '#212529' } as const
const FONT = 'font-family:Archivo,Arial,Helvetica,sans-serif'
/** A mark in its disc, as on the court; where a reader draws no round corners it is a square. */
const DISC = `display:inline-block;min-width:24px;border-radius:12px;background:${INK.graphite};color:#ffffff;font-size:14px;line-height:24px;font-weight:700;text-align:center`
/** Width of the one column, px, and of what stands in it. */
const COLUMN = 592
const INSIDE = COLUMN - 2 * 30

const ENTITIES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}
const escape = (words: string): string => words.replace(/[&<>"']/g, (letter) => ENTITIES[letter] ?? letter)
/** Escaped, with its line breaks kept. */
const lines = (words: string): string => escape(words).replace(/\r?\n/g, '<br>')

/**
 * The address of a button; only web addresses lead out of a letter.
 * @throws Error for any other scheme, which is a fault of the one who wrote the letter.
 */
function webAddress(url: string): string {
  if (!/^https?:\/\//i.test(url)) throw new Error(`A letter links to web addresses only, not to ${url}.`)
  return url
}

/** @throws Error when a letter has more than one button or links to something else than a web address. */
export function renderLetter(subject: string, body: LetterBody): RenderedLetter {
  if (body.blocks.filter(({ kind }) => kind === 'button').length > 1)
    throw new Error('A letter has one button.')
  return { text: textOf(body), html: htmlOf(subject, body) }
}

function textOf({ blocks, why }: LetterBody): string {
  return `${blocks.map(textBlock).join('\n\n')}\n\n${why}\n`
}

function textBlock(block: LetterBlock): string {
  switch (block.kind) {
    case 'heading':
    case 'paragraph':
      return block.text
    case 'button':
      return `${block.label}:\n${webAddress(block.url)}`
    case 'rows':
      return block.rows
        .map(({ mark, text, value }) => `${mark ? `${mark}  ` : ''}${text}${value ? `  ${value}` : ''}`)
        .join('\n')
    case 'drawing':
      return `(${block.alternative})`
  }
}

function htmlOf(subject: string, { blocks, why }: LetterBody): string {
  const parts = blocks.map(htmlBlock).join('\n')
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escape(subject)}</title>
</head>
<body style="margin:0;padding:0;background:#efebe2">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0" style="background:#efebe2">
<tr><td align="center" style="padding:24px 8px">
<table role="presentation" width="${COLUMN}" cellpadding="0" cellspacing="0" border="0" style="width:100%;max-width:${COLUMN}px;background:#fdfcf8;border-top:3px solid ${INK.graphite}">
<tr><td style="padding:20px 30px 26px;color:${INK.graphite};${FONT};font-size:17px;line-height:1.45">
<p style="margin:0 0 16px;font-size:16px;font-weight:800;${FONT}">Overtop</p>
${parts}
<p style="margin:22px 0 0;padding-top:12px;border-top:1px solid #cfc8b9;color:#4c5155;font-size:13px;line-height:1.4;${FONT}">${lines(why)}</p>
</td></tr>
</table>
</td></tr>
</table>
</body>
</html>
`
}

function htmlBlock(block: LetterBlock): string {
  switch (block.kind) {
    case 'heading':
      return `<h1 style="margin:0 0 6px;color:${INK[block.ink ?? 'graphite']};font-size:29px;line-height:1.2;font-weight:800;${FONT}">${lines(block.text)}</h1>`
    case 'paragraph':
      return `<p style="margin:0 0 14px;${FONT}">${lines(block.text)}</p>`
    case 'button':
      return buttonOf(block.label, webAddress(block.url))
    case 'rows':
      return rowsOf(block.rows)
    case 'drawing':
      return `<p style="margin:0 0 14px"><img src="data:image/png;base64,${block.png.toString('base64')}" width="${INSIDE}" alt="${escape(block.alternative)}" style="display:block;width:100%;max-width:${INSIDE}px;height:auto;border:0"></p>`
  }
}

/** The whole bar is the link, also where a client draws no padding on links; its address stands below for copying. */
const buttonOf = (label: string, url: string): string =>
  `<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0" style="margin:6px 0 14px">
<tr><td align="center" bgcolor="${INK.our}" style="background:${INK.our}"><a href="${escape(url)}" style="display:block;padding:17px 16px;color:#ffffff;font-size:17px;font-weight:700;text-decoration:none;${FONT}">${escape(label)}</a></td></tr>
</table>
<p style="margin:0 0 14px;color:#4c5155;font-size:13px;line-height:1.4;word-break:break-all;${FONT}">${escape(url)}</p>`

function rowsOf(rows: readonly LetterRow[]): string {
  const cell = 'padding:9px 8px 9px 0;border-bottom:1px solid #cfc8b9'
  const row = ({ mark, text, value, ink }: LetterRow) =>
    `<tr>${mark === undefined ? '' : `<td width="36" valign="top" style="${cell}"><span style="${DISC};${FONT}">${escape(mark)}</span></td>`}<td valign="top" style="${cell};${FONT}">${lines(text)}</td><td align="right" valign="top" style="${cell};padding-right:0;color:${INK[ink ?? 'graphite']};font-weight:700;white-space:nowrap;${FONT}">${escape(value ?? '')}</td></tr>`
  return `<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0" style="margin:0 0 14px">
${rows.map(row).join('\n')}
</table>`
}
