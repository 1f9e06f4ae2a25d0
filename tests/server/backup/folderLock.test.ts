import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { FolderInUse, LOCK_FILE, lockFolder } from '@server/adapters/folderLock'

let folder: string
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-lock-'))
})
afterEach(() => rm(folder, { recursive: true, force: true }))

/** Another process that holds the folder as ours does, and says so. */
async function otherHolder() {
  const script = `
    const Database = require('better-sqlite3')
    const file = new Database(${JSON.stringify(join(folder, LOCK_FILE))})
    file.exec('BEGIN IMMEDIATE')
    file.pragma('user_version = ' + process.pid)
    file.exec('COMMIT; BEGIN IMMEDIATE')
    console.log('held')
    setInterval(() => {}, 1000)`
  const child = spawn(process.execPath, ['-e', script], { stdio: ['ignore', 'pipe', 'inherit'] })
  await once(child.stdout, 'data')
  return child
}

const refusal = (): unknown => {
  try {
    lockFolder(folder)()
  } catch (error) {
    return error
  }
  return null
}

describe('a data folder', () => {
  it('is held by one at a time, and free once let go', () => {
    const letGo = lockFolder(folder)
    expect(refusal()).toMatchObject({ folder, pid: process.pid })
    expect(refusal()).toBeInstanceOf(FolderInUse)
    letGo()
    expect(refusal()).toBeNull()
  })

  it('says which process has it, and is free at once when that process is killed', async () => {
    const child = await otherHolder()
    try {
      expect(refusal()).toMatchObject({ message: `${folder} is in use by process ${child.pid}.` })
    } finally {
      child.kill('SIGKILL')
      await once(child, 'exit')
    }
    expect(refusal()).toBeNull()
  })

  it('is not held by an id that a dead process left in the file', () => {
    // Process 1 is always alive: an id alone would say that the folder is in use.
    lockFolder(folder, 1)()
    expect(refusal()).toBeNull()
  })
})
