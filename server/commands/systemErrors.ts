/** What the system refuses that a person at the machine can mend; null for anything else. */
export function wordsForSystemError(error: unknown): string | null {
  if (!(error instanceof Error)) return null
  const { code, path } = error as NodeJS.ErrnoException
  const where = path ?? 'a file of the data folder'
  switch (code) {
    case 'ENOSPC':
    case 'SQLITE_FULL':
      return 'The disk is full. Make room, then run it again.'
    case 'EACCES':
    case 'EPERM':
    case 'EROFS':
    case 'SQLITE_READONLY':
      return `${where} may not be read or written. Run it as the user that runs the server, on a disk that can be written to.`
    case 'SQLITE_CANTOPEN':
      return 'The database cannot be opened. Check DATA_DIR and who may read it.'
    case 'SQLITE_NOTADB':
    case 'SQLITE_CORRUPT':
      return 'The database file is damaged. Restore the newest backup that is whole: npm run restore -- folder --replace'
    case 'ENOTDIR':
    case 'EEXIST':
      return `${where} is in the way. Name another folder.`
    default:
      return null
  }
}
