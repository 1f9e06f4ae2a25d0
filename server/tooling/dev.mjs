/** `npm run dev`: client and API from source on one port, with live reload. */
import { spawn } from 'node:child_process'
import { ready } from './ready.mjs'

await ready()
const port = process.env.PORT || '5173'
spawn(process.execPath, ['node_modules/vite/bin/vite.js', '--port', port, '--strictPort'], {
  stdio: 'inherit',
}).on('exit', (code) => process.exit(code ?? 1))
