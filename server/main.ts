import { join } from 'node:path'
import { FolderInUse } from './adapters/folderLock'
import { createApp } from './app'
import { boot, type Booted } from './boot'
import { serveClient } from './clientFiles'
import { ConfigError, readConfig, type Config } from './config'
import { linkTo } from './features/mail/linkTo'
import { DEMO_PASSWORD, DEMO_SIGN_INS } from './database/demo/people'
import { startHousekeeping } from './housekeeping'

const say = (line: string) => process.stdout.write(`${line}\n`)

function configOrStop(): Config {
  try {
    return readConfig(process.env)
  } catch (error) {
    if (!(error instanceof ConfigError)) throw error
    for (const fault of error.faults) process.stderr.write(`${fault}\n`)
    process.exit(1)
  }
}

function bootOrStop(config: Config): Promise<Booted> {
  return boot(config).catch((error: unknown) => {
    if (!(error instanceof FolderInUse)) throw error
    process.stderr.write(`${error.message} Stop it first, or set DATA_DIR to another folder.\n`)
    process.exit(1)
  })
}

const config = configOrStop()
const { context, demoIsIn, close } = await bootOrStop(config)
const app = createApp(context)
serveClient(app, join(import.meta.dirname, '../client'), context.log)
const stopHousekeeping = startHousekeeping(context)

const server = app.listen(config.port, config.host, () => {
  const address = server.address()
  const port = typeof address === 'object' && address !== null ? address.port : config.port
  const reached = { ...config, port }
  say(`Overtop is at ${linkTo(reached, '/').replace(/\/$/, '')}`)
  if (context.firstRunToken)
    say(
      `There is no team yet. Set the first one up at ${linkTo(reached, `/first-run#${context.firstRunToken}`)}`,
    )
  if (config.demo && demoIsIn) {
    say(`Demo sign-ins, all with the password ${DEMO_PASSWORD}:`)
    for (const { email, says } of DEMO_SIGN_INS) say(`  ${email.padEnd(30)} ${says}`)
  }
})
server.on('error', (error: NodeJS.ErrnoException) => {
  process.stderr.write(
    error.code === 'EADDRINUSE'
      ? `Port ${config.port} is taken. Set PORT to another one.\n`
      : `Cannot listen on ${config.host}:${config.port}: ${error.code ?? error.message}\n`,
  )
  process.exit(1)
})

let stopping = false
function stop(): void {
  if (stopping) return
  stopping = true
  stopHousekeeping()
  server.close(() => void close().then(() => process.exit(0)))
  server.closeIdleConnections()
}
process.on('SIGINT', stop)
process.on('SIGTERM', stop)
