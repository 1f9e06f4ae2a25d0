import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Writable } from 'node:stream'
import express, { type Express } from 'express'
import { pino } from 'pino'
import request from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { serveClient } from '@server/clientFiles'

let folder: string
let app: Express
let logged = ''

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-client-'))
  await mkdir(join(folder, 'assets'))
  await writeFile(join(folder, 'index.html'), '<title>Overtop</title>')
  await writeFile(join(folder, 'assets', 'a.js'), 'export {}')
})
afterAll(() => rm(folder, { recursive: true, force: true }))
beforeEach(() => {
  logged = ''
  app = express()
  const sink = new Writable({
    write: (chunk: Buffer, _encoding, done) => ((logged += chunk.toString()), done()),
  })
  serveClient(app, folder, pino(sink))
})

describe('the client’s files', () => {
  it('stand under their names, and every other address is the page’s own to answer', async () => {
    expect((await request(app).get('/assets/a.js')).headers['cache-control']).toContain('immutable')
    for (const path of ['/', '/teams/one/read', '/index.html/else'])
      expect((await request(app).get(path)).text).toBe('<title>Overtop</title>')
  })

  it.each([
    ['get', '/assets/gone.js'],
    ['get', '/%E0%A4%A'],
    ['get', '/assets/%2e%2e/%2e%2e/package.json'],
    ['get', '/assets/.git'],
    ['post', '/teams/one'],
  ] as const)('%s %s is nowhere: one plain line, no stack, no line in the log', async (method, path) => {
    const answer = await request(app)[method](path)
    expect([answer.status, answer.type, answer.text]).toEqual([404, 'text/plain', 'There is nothing here.'])
    expect(logged).toBe('')
  })
})
