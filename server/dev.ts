import type { Express } from 'express'
import { createApp } from './app'
import { boot } from './boot'
import { readConfig } from './config'
import type { Context } from './context'

/** The open database outlives a reload of this module; only the app is made anew. */
const kept = globalThis as typeof globalThis & { overtopContext?: Promise<Context> }
kept.overtopContext ??= boot(readConfig(process.env)).then(({ context }) => context)

/** The API for Vite's dev server (server/tooling/apiInDev.ts). */
export const app: Promise<Express> = kept.overtopContext.then(createApp)
