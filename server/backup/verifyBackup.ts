import { readFile, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { CommandError } from '../commands/commandError'
import { describeFile, isMissing } from './files'
import { MANIFEST_FILE, readManifest, type BackupFile, type Manifest } from './manifest'

const NOTHING = 'Nothing was changed.'

/**
 * The manifest of a backup, once every file it lists is there and is what it was when it was made.
 * @throws CommandError naming the first file that is not, and what to do.
 */
export async function verifyBackup(folder: string): Promise<Manifest> {
  const manifest = await manifestOf(folder)
  for (const file of manifest.files) await verifyFile(folder, file)
  return manifest
}

async function manifestOf(folder: string): Promise<Manifest> {
  let text: string
  try {
    text = await readFile(join(folder, MANIFEST_FILE), 'utf8')
  } catch (error) {
    if (!isMissing(error) && (error as NodeJS.ErrnoException).code !== 'ENOTDIR') throw error
    throw new CommandError(
      `${folder} is no backup: it has no ${MANIFEST_FILE}. Name a folder that npm run backup made. ${NOTHING}`,
    )
  }
  const manifest = readManifest(text)
  if ('fault' in manifest)
    throw new CommandError(`${folder} cannot be restored: ${manifest.fault}. Take another one. ${NOTHING}`)
  return manifest
}

async function verifyFile(folder: string, listed: BackupFile): Promise<void> {
  const refuse = (what: string) =>
    new CommandError(`${join(folder, listed.path)} ${what}. Take another backup. ${NOTHING}`)
  const there = await stat(join(folder, listed.path)).catch((error: unknown) => {
    if (isMissing(error)) return null
    throw error
  })
  if (!there?.isFile()) throw refuse('is missing')
  const { bytes, sha256 } = await describeFile(folder, listed.path)
  if (bytes !== listed.bytes || sha256 !== listed.sha256) throw refuse('is not what was backed up')
}
