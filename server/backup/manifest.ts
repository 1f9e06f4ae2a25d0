import { z } from 'zod'

export const MANIFEST_FILE = 'manifest.json'
export const DATABASE_FILE = 'overtop.sqlite'
export const STILLS_FOLDER = 'stills'
/** Goes up when an older restore could no longer read what a backup holds. */
export const FORMAT = 1

/** One file of a backup: where it lies below the backup's folder, written with slashes. */
const BackupFile = z.object({
  path: z.union([z.literal(DATABASE_FILE), z.string().regex(/^stills\/[\w-]+\/[\w-]+(\.[\w-]+)+$/)]),
  bytes: z.int().min(0),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
})
export type BackupFile = z.infer<typeof BackupFile>

/** What a backup says of itself. */
export const Manifest = z.object({
  format: z.literal(FORMAT),
  /** RFC 3339, UTC. */
  madeAt: z.iso.datetime(),
  newestMigration: z.string(),
  /** Rows per table, as copied. */
  rows: z.record(z.string(), z.int().min(0)),
  files: z.array(BackupFile).min(1),
})
export type Manifest = z.infer<typeof Manifest>

/** The text as a manifest; why not, in words, when it is none that this version reads. */
export function readManifest(text: string): Manifest | { fault: string } {
  let value: unknown
  try {
    value = JSON.parse(text)
  } catch {
    return { fault: `${MANIFEST_FILE} is damaged` }
  }
  const format = z.object({ format: z.int() }).safeParse(value)
  if (format.success && format.data.format !== FORMAT)
    return { fault: `its format is ${format.data.format} and this version of Overtop reads ${FORMAT}` }
  const parsed = Manifest.safeParse(value)
  return parsed.success ? parsed.data : { fault: `${MANIFEST_FILE} is damaged` }
}

/** What of two counts of rows differs, as "table: wanted, got"; empty when none does. */
export function differingRows(wanted: Manifest['rows'], got: Manifest['rows']): string[] {
  const tables = [...new Set([...Object.keys(wanted), ...Object.keys(got)])].sort()
  return tables
    .filter((table) => wanted[table] !== got[table])
    .map((table) => `${table}: ${wanted[table] ?? 'none'} listed, ${got[table] ?? 'none'} found`)
}
