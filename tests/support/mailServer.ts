import type { AddressInfo } from 'node:net'
import { SMTPServer, type SMTPServerOptions } from 'smtp-server'

/** A part of a letter as it arrived: its headers by lower-case name, its decoded content, the parts inside. */
export interface Part {
  headers: Map<string, string>
  content: Buffer
  parts: Part[]
}

export interface Arrived {
  from: string
  to: string[]
  letter: Part
}

export interface MailServer {
  /** smtp://127.0.0.1:port */
  url: string
  arrived: Arrived[]
  /** What is answered to the next recipients, in order; none left: taken. */
  refuse: number[]
  /** How many recipients were named to it, taken or not. */
  asked: () => number
  stop: () => Promise<void>
}

/** A real SMTP server on a port of its own that keeps what arrives. */
export async function startMailServer(options: SMTPServerOptions = {}): Promise<MailServer> {
  const arrived: Arrived[] = []
  const refuse: number[] = []
  let asked = 0
  const server = new SMTPServer({
    hideSTARTTLS: true,
    authOptional: true,
    disableReverseLookup: true,
    onRcptTo: (_address, _session, done) => {
      asked += 1
      const code = refuse.shift()
      if (code === undefined) return done()
      done(Object.assign(new Error('Requested action not taken'), { responseCode: code }))
    },
    onData: (stream, session, done) => {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        const { mailFrom, rcptTo } = session.envelope
        arrived.push({
          from: mailFrom === false ? '' : mailFrom.address,
          to: rcptTo.map(({ address }) => address),
          letter: readPart(Buffer.concat(chunks).toString('latin1')),
        })
        done()
      })
    },
    ...options,
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.server.address() as AddressInfo
  return {
    url: `smtp://127.0.0.1:${port}`,
    arrived,
    refuse,
    asked: () => asked,
    stop: () => new Promise((resolve) => server.close(resolve)),
  }
}

/** RFC 5322 headers and RFC 2045 bodies, as far as our own letters use them. */
function readPart(source: string): Part {
  const split = source.indexOf('\r\n\r\n')
  const head = source.slice(0, split).replace(/\r\n[ \t]+/g, ' ')
  const body = source.slice(split + 4)
  const headers = new Map(
    head.split('\r\n').map((line) => {
      const colon = line.indexOf(':')
      return [line.slice(0, colon).toLowerCase(), words(line.slice(colon + 1).trim())]
    }),
  )
  const [, boundary] = /boundary="?([^";]+)"?/.exec(headers.get('content-type') ?? '') ?? []
  const parts =
    boundary === undefined
      ? []
      : body
          .split(`--${boundary}`)
          .slice(1, -1)
          .map((part) => readPart(part.replace(/^\r\n/, '').replace(/\r\n$/, '')))
  return { headers, content: decode(body, headers.get('content-transfer-encoding') ?? '7bit'), parts }
}

function decode(body: string, encoding: string): Buffer {
  if (encoding === 'base64') return Buffer.from(body, 'base64')
  if (encoding === 'quoted-printable') return Buffer.from(quoted(body.replace(/=\r\n/g, '')), 'latin1')
  return Buffer.from(body, 'latin1')
}

const quoted = (text: string): string =>
  text.replace(/=([0-9A-F]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)))

/** RFC 2047 words of a header as text. */
const words = (header: string): string =>
  header
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?UTF-8\?([QB])\?([^?]*)\?=/gi, (_, kind: string, text: string) =>
      kind.toUpperCase() === 'B'
        ? Buffer.from(text, 'base64').toString()
        : Buffer.from(quoted(text.replace(/_/g, ' ')), 'latin1').toString(),
    )

/** The first part of a type, wherever it lies, e.g. text/plain. */
export function partOf(letter: Part, type: string): Part | null {
  if ((letter.headers.get('content-type') ?? '').startsWith(type)) return letter
  for (const part of letter.parts) {
    const found = partOf(part, type)
    if (found) return found
  }
  return null
}

export const textOf = (letter: Part, type = 'text/plain'): string =>
  (partOf(letter, type)?.content.toString() ?? '').replace(/\r\n/g, '\n')
