import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

export interface ReadPdf {
  /** All text, line breaks and runs of spaces made one space. */
  text: string
  /** What pdfinfo says, by its own words: "Pages", "Page size", "Tagged". */
  info: ReadonlyMap<string, string>
  /** Name and "emb" column of every font. */
  fonts: { name: string; embedded: boolean }[]
  /** The structure tree as pdfinfo prints it. */
  structure: string
}

/** Reads a PDF back with poppler's tools, as somebody else's program would. */
export function readPdf(pdf: Buffer): ReadPdf {
  const folder = mkdtempSync(join(tmpdir(), 'overtop-pdf-'))
  const file = join(folder, 'sheet.pdf')
  try {
    writeFileSync(file, pdf)
    const run = (tool: string, ...args: string[]) => execFileSync(tool, args, { encoding: 'utf8' })
    const info = run('pdfinfo', file)
      .split('\n')
      .flatMap((line) => {
        const at = line.indexOf(':')
        return at < 0 ? [] : [[line.slice(0, at), line.slice(at + 1).trim()] as const]
      })
    const fonts = run('pdffonts', file)
      .split('\n')
      .slice(2)
      .filter((line) => line.trim() !== '')
      .map((line) => ({ name: line.slice(0, 37).trim(), embedded: line.slice(72, 76).trim() === 'yes' }))
    return {
      text: run('pdftotext', file, '-').replace(/\s+/g, ' '),
      info: new Map(info),
      fonts,
      structure: run('pdfinfo', '-struct-text', file),
    }
  } finally {
    rmSync(folder, { recursive: true })
  }
}
