import { resolve } from 'node:path'
import PDFDocument from 'pdfkit'
import request from 'supertest'
import { TEAM, teamCookie, type TestApp } from '../support/testApp'
import { byTurns, line, processor } from './measure'

const PATH_OPERATOR = /^(.*\s)?(m|l|c|re|h|S|f|B)$/

/** How many path operators a page draws, read from an uncompressed copy of the same drawing. */
const countPaths = (content: string) => content.split('\n').filter((row) => PATH_OPERATOR.test(row)).length

function collect(doc: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((done) => {
    const parts: Buffer[] = []
    doc.on('data', (part: Buffer) => parts.push(part))
    doc.on('end', () => done(Buffer.concat(parts)))
    doc.end()
  })
}

/** The faces that a sheet embeds, as pdffonts lists them. */
const FACES = [
  '@expo-google-fonts/archivo/400Regular/Archivo_400Regular.ttf',
  '@expo-google-fonts/archivo/500Medium/Archivo_500Medium.ttf',
  '@expo-google-fonts/archivo/700Bold/Archivo_700Bold.ttf',
  '@expo-google-fonts/archivo/800ExtraBold/Archivo_800ExtraBold.ttf',
  '@expo-google-fonts/archivo-narrow/700Bold/ArchivoNarrow_700Bold.ttf',
].map((file) => resolve('node_modules', file))

/** A plain pdfkit page with as many path operators and one line in each face that a sheet embeds. */
async function barePage(operators: number): Promise<Buffer> {
  const doc = new PDFDocument({ size: 'A4' })
  for (const face of FACES) doc.font(face).text('Look middle first', 40, 40)
  for (let index = 0; index < operators / 3; index++)
    doc
      .moveTo(index % 500, 60)
      .lineTo(index % 500, 700)
      .stroke()
  return collect(doc)
}

export async function benchPaper(test: TestApp, sheetId: string, rounds: number): Promise<string[]> {
  const { inflateSync } = await import('node:zlib')
  const cookie = await teamCookie(test, 'head')
  const get = async (paper: string) => {
    const answer = await request(test.app)
      .get(`/api/teams/${TEAM}/sheets/${sheetId}.pdf?paper=${paper}`)
      .set('Cookie', cookie)
      .buffer(true)
      .parse((res, done) => {
        const parts: Buffer[] = []
        res.on('data', (part: Buffer) => parts.push(part))
        res.on('end', () => done(null, Buffer.concat(parts)))
      })
    if (answer.status !== 200) throw new Error(`the sheet answered ${answer.status}`)
    return answer.body as Buffer
  }
  const pdf = (await get('a4')).toString('latin1')
  const streams = [...pdf.matchAll(/stream\r?\n([\s\S]*?)\r?\nendstream/g)].map(([, data = '']) => {
    try {
      return inflateSync(Buffer.from(data, 'latin1')).toString('latin1')
    } catch {
      return ''
    }
  })
  const operators = Math.max(...streams.map(countPaths))
  const times = await byTurns(
    rounds,
    processor,
    () => get('a4'),
    () => barePage(operators),
  )
  return [line(`sheet PDF, ${operators} path operators`, times.ours.median, times.floor.median, 'ms')]
}
