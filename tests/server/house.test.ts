import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'

/** The arrows of ARCHITECTURE.md, read from the imports themselves. */
const ROOT = resolve(import.meta.dirname, '../..')
const AREAS = ['shared', 'server', 'src']

function* sources(folder: string): Generator<string> {
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    const path = join(folder, entry.name)
    if (entry.isDirectory()) yield* sources(path)
    else if (/\.(ts|vue|mjs)$/.test(entry.name) && !entry.name.endsWith('.d.ts')) yield path
  }
}

interface Import {
  from: string
  /** Path from the root for our own files, the package's name otherwise. */
  to: string
  own: boolean
}

/** A sentence may end in the word from; no package's name holds a space or a bracket. */
const IMPORT = /(?:from|import)\s*\(?\s*['"]([\w@./-]+)['"]/g

function importsOf(file: string): Import[] {
  const from = relative(ROOT, file)
  return [...readFileSync(file, 'utf8').matchAll(IMPORT)].map(([, target = '']) => {
    if (target.startsWith('.')) return { from, to: relative(ROOT, resolve(dirname(file), target)), own: true }
    for (const [alias, area] of [
      ['@shared/', 'shared/'],
      ['@server/', 'server/'],
      ['@/', 'src/'],
    ] as const)
      if (target.startsWith(alias)) return { from, to: area + target.slice(alias.length), own: true }
    return { from, to: target, own: false }
  })
}

const IMPORTS = AREAS.flatMap((area) => [...sources(join(ROOT, area))]).flatMap(importsOf)

/** `from` may not import `to`; both are the beginnings of paths. */
function broken(from: RegExp, to: RegExp, except: RegExp = /^$/): string[] {
  return IMPORTS.filter(
    (line) => line.own && from.test(line.from) && to.test(line.to) && !except.test(line.from),
  ).map((line) => `${line.from} -> ${line.to}`)
}

describe('the import arrows', () => {
  it('are read from a tree that has imports in every area', () => {
    for (const area of AREAS)
      expect(IMPORTS.filter((line) => line.from.startsWith(area)).length).toBeGreaterThan(20)
  })

  it('shared imports nothing of ours but shared, and only small pure packages', () => {
    expect(broken(/^shared\//, /^(server|src)\//)).toEqual([])
    const packages = IMPORTS.filter((line) => !line.own && line.from.startsWith('shared/')).map(
      (line) => line.to,
    )
    expect([...new Set(packages)].filter((name) => !['zod', 'jstat', 'munkres'].includes(name))).toEqual([])
  })

  it('src and server never meet', () => {
    expect(broken(/^src\//, /^server\//)).toEqual([])
    expect(broken(/^server\//, /^src\//)).toEqual([])
  })

  it('the engine knows no database, request, adapter or clock', () => {
    expect(broken(/^server\/engine\//, /^server\/(?!engine\/)/)).toEqual([])
    const packages = IMPORTS.filter((line) => !line.own && line.from.startsWith('server/engine/')).map(
      (line) => line.to,
    )
    expect(
      [...new Set(packages)].filter(
        (name) => !['json-rules-engine', 'munkres', 'jstat', 'zod'].includes(name),
      ),
    ).toEqual([])
    const clocks = [...sources(join(ROOT, 'server/engine'))].filter((file) =>
      /\bDate\b|Math\.random/.test(readFileSync(file, 'utf8')),
    )
    expect(clocks).toEqual([])
  })

  it('nothing imports routes but the app', () => {
    expect(broken(/^server\//, /\.routes$/, /^server\/app\.ts$/)).toEqual([])
  })

  it('services, presenters and policies stay away from Express', () => {
    const express = IMPORTS.filter(
      (line) => line.to === 'express' && /\.(service|presenter|policy)\.ts$/.test(line.from),
    )
    expect(express).toEqual([])
  })

  it('the database knows no feature, and adapters know neither', () => {
    expect(broken(/^server\/database\//, /^server\/features\//)).toEqual([])
    expect(broken(/^server\/adapters\//, /^server\/(features|database|engine)\//)).toEqual([])
  })

  it('components know no store, no route and no view', () => {
    expect(broken(/^src\/components\//, /^src\/(stores|router|views)\//)).toEqual([])
    const routed = IMPORTS.filter((line) => line.from.startsWith('src/components/') && line.to === 'pinia')
    expect(routed).toEqual([])
  })

  it('only src/api calls fetch', () => {
    const callers = [...sources(join(ROOT, 'src'))].filter(
      (file) =>
        /\b(fetch\(|XMLHttpRequest|sendBeacon)/.test(readFileSync(file, 'utf8')) &&
        !relative(ROOT, file).startsWith('src/api/'),
    )
    expect(callers.map((file) => relative(ROOT, file))).toEqual([])
  })
})
