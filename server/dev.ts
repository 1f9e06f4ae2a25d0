import type { Express } from 'express'
import { createApp } from './app'
import { boot, type Booted } from './boot'
import { readConfig } from './config'
import { ENTITIES } from './database/entities/all'

interface Kept {
  entities: typeof ENTITIES
  booted: Promise<Booted>
}

/**
 * The open database outlives a reload of this module and only the app is made anew; unless the entities
 * themselves were reloaded, for TypeORM knows rows by their classes.
 */
const kept = globalThis as typeof globalThis & { overtop?: Kept }

async function bootAfter(before: Kept | undefined): Promise<Booted> {
  await before?.booted.then(({ close }) => close())
  return boot(readConfig(process.env))
}

if (kept.overtop?.entities !== ENTITIES)
  kept.overtop = { entities: ENTITIES, booted: bootAfter(kept.overtop) }

/** The API for Vite's dev server (server/tooling/apiInDev.ts). */
export const app: Promise<Express> = kept.overtop.booted.then(({ context }) => createApp(context))
