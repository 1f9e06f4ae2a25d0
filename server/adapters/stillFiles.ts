import { mkdir, rename, rm, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'

export type StillSize = 'full' | 'thumbnail'

/** Where the pictures of stills lie on disk; named by id, below one folder per team. */
export interface StillFiles {
  /** Absolute path of a stored picture; the file may not exist. */
  pathOf(teamId: string, stillId: string, size: StillSize): string
  /** Writes both sizes; a reader never sees half a file. */
  keep(teamId: string, stillId: string, pictures: Record<StillSize, Buffer>): Promise<void>
  /** Removes both sizes; missing files are no fault. */
  remove(teamId: string, stillId: string): Promise<void>
}

/** Files below `dataDir`/stills. */
export function diskStillFiles(dataDir: string): StillFiles {
  const pathOf = (teamId: string, stillId: string, size: StillSize) =>
    join(dataDir, 'stills', teamId, `${stillId}${size === 'thumbnail' ? '.thumb' : ''}.jpg`)
  return {
    pathOf,
    async keep(teamId, stillId, pictures) {
      const written: string[] = []
      try {
        for (const size of ['full', 'thumbnail'] as const) {
          const path = pathOf(teamId, stillId, size)
          await mkdir(dirname(path), { recursive: true })
          await writeFile(`${path}.part`, pictures[size])
          await rename(`${path}.part`, path)
          written.push(path)
        }
      } catch (error) {
        await Promise.all(written.map((path) => rm(path, { force: true })))
        throw error
      }
    },
    async remove(teamId, stillId) {
      await rm(pathOf(teamId, stillId, 'full'), { force: true })
      await rm(pathOf(teamId, stillId, 'thumbnail'), { force: true })
    },
  }
}
