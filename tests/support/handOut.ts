import { randomUUID } from 'node:crypto'
import type { CopyRow } from '@shared/sheets/handOut'
import { teamUrl } from './fixture'
import { newGame, newOpponent } from './scouted'
import type { Agent } from './testApp'

/** Signs a plan for a game and hands back its sheet. @throws when the server does not */
export async function signedSheet(head: Agent, game: string, counters: readonly string[]): Promise<string> {
  const [planId, sheetId] = [randomUUID(), randomUUID()]
  const url = teamUrl(`/games/${game}/plan`)
  const body = { id: planId, firstCallId: counters[0], changeUpId: counters[1], keys: ['Look middle first.'] }
  const put = await head.put(url).send(body)
  const done = await head.post(`${url}/sign-off`).set('If-Match', '"1"').send({ planId, sheetId })
  if (put.status !== 201 || done.status !== 200) throw new Error(JSON.stringify([put.body, done.body]))
  return sheetId
}

/** A sheet of a game of its own. */
export const freshSheet = async (head: Agent, counters: readonly string[]): Promise<string> =>
  signedSheet(head, await newGame(head, await newOpponent(head)), counters)

/** Makes papers and hands back the whole list. */
export async function papers(
  agent: Agent,
  sheet: string,
  copies: { id?: string; squadPlayerId?: string | null }[],
): Promise<CopyRow[]> {
  const answer = await agent
    .post(teamUrl(`/sheets/${sheet}/copies`))
    .send({ copies: copies.map((copy) => ({ id: randomUUID(), ...copy })) })
  if (answer.status !== 200) throw new Error(JSON.stringify(answer.body))
  return answer.body.rows as CopyRow[]
}

export const asBytes = <T extends { buffer: (on: boolean) => T; parse: (parser: never) => T }>(
  request: T,
): T =>
  request.buffer(true).parse(((answer: NodeJS.ReadableStream, done: (e: null, b: Buffer) => void) => {
    const chunks: Buffer[] = []
    answer.on('data', (chunk: Buffer) => chunks.push(chunk))
    answer.on('end', () => done(null, Buffer.concat(chunks)))
  }) as never)
