/** `npm run dev`: client and API from source on one port, with live reload. */
import { spawn } from 'node:child_process'
import { existsSync } from 'node:fs'
import { ready } from './ready.mjs'

await ready()
const port = process.env.PORT || '5173'
const env = existsSync('.env') ? ['--env-file=.env'] : []
spawn(process.execPath, [...env, 'node_modules/vite/bin/vite.js', '--port', port, '--strictPort'], {
  stdio: 'inherit',
}).on('exit', (code) => process.exit(code ?? 1))
