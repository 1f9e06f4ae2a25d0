import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'

export type StillSize = 'full' | 'thumbnail'

const SIZES = ['full', 'thumbnail'] as const

/** Where the pictures of stills lie on disk; named by id, below one folder per team. */
export interface StillFiles {
  /** Absolute path of a stored picture; the file may not exist. */
  pathOf(teamId: string, stillId: string, size: StillSize): string
  /** Writes both sizes; a reader never sees half a file. */
  keep(teamId: string, stillId: string, pictures: Record<StillSize, Buffer>): Promise<void>
  /** The bytes of the full picture. */
  read(teamId: string, stillId: string): Promise<Buffer>
  /** Puts other pictures in the place of both sizes; what was there is gone. Until both are written nothing changes. */
  replace(teamId: string, stillId: string, pictures: Record<StillSize, Buffer>): Promise<void>
  /** Removes both sizes and what was half written; missing files are no fault. */
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
        for (const size of SIZES) {
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
    read: (teamId, stillId) => readFile(pathOf(teamId, stillId, 'full')),
    async replace(teamId, stillId, pictures) {
      // The small one last: whoever finds them of two ages finds the large one done.
      const paths = SIZES.map((size) => ({ size, path: pathOf(teamId, stillId, size) }))
      try {
        for (const { size, path } of paths) await writeFile(`${path}.part`, pictures[size])
        for (const { path } of paths) await rename(`${path}.part`, path)
      } catch (error) {
        await Promise.all(paths.map(({ path }) => rm(`${path}.part`, { force: true })))
        throw error
      }
    },
    async remove(teamId, stillId) {
      for (const size of SIZES) {
        const path = pathOf(teamId, stillId, size)
        await rm(path, { force: true })
        await rm(`${path}.part`, { force: true })
      }
    },
  }
}
