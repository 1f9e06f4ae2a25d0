import { createHash } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { copyFile, mkdir, open, readdir, stat } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import type { BackupFile } from './manifest'

export const isMissing = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === 'ENOENT'

/** The names in a folder, in order; none when there is no such folder. */
export async function namesIn(folder: string): Promise<string[]> {
  try {
    return (await readdir(folder)).sort()
  } catch (error) {
    if (isMissing(error)) return []
    throw error
  }
}

/** Whether there is anything at a path. */
export async function exists(path: string): Promise<boolean> {
  try {
    await stat(path)
    return true
  } catch (error) {
    if (isMissing(error)) return false
    throw error
  }
}

/** Copies a file and waits until it is on the disk; folders are made on the way, for their owner only. */
export async function copyWhole(from: string, to: string): Promise<void> {
  await mkdir(dirname(to), { recursive: true, mode: 0o700 })
  await copyFile(from, to)
  await settle(to)
}

/** Waits until what was written to a file is on the disk. */
export async function settle(path: string): Promise<void> {
  const file = await open(path, 'r+')
  try {
    await file.sync()
  } finally {
    await file.close()
  }
}

/** Size and digest of a file below `folder`, as a manifest lists it. */
export async function describeFile(folder: string, path: string): Promise<BackupFile> {
  const hash = createHash('sha256')
  let bytes = 0
  for await (const chunk of createReadStream(join(folder, path)) as AsyncIterable<Buffer>) {
    hash.update(chunk)
    bytes += chunk.length
  }
  return { path, bytes, sha256: hash.digest('hex') }
}

const UNITS = ['bytes', 'kB', 'MB', 'GB', 'TB']

/** A size as it is read out, e.g. "3.4 MB". */
export function sizeInWords(bytes: number): string {
  let size = bytes
  let unit = 0
  while (size >= 1000 && unit < UNITS.length - 1) {
    size /= 1000
    unit += 1
  }
  return `${unit === 0 ? size : size.toFixed(1)} ${UNITS[unit] ?? ''}`
}
