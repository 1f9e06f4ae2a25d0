/** `npm run migration -- Name`: runs the TypeScript below through Vite, as the server itself is run. */
import { runnerImport } from 'vite'
import { ready } from './ready.mjs'

await ready()
const { module } = await runnerImport(new URL('./writeMigration.ts', import.meta.url).pathname)
await module.writeMigration(process.argv[2])
