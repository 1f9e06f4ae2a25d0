/** Lengths, sizes and types: one source for the form, the request and the column. */
export const LIMITS = {
  name: 80,
  email: 254,
  /** RFC 5321 section 4.5.3.1: octets of the part before the @. */
  emailLocalPart: 64,
  passwordShortest: 10,
  passwordLongest: 200,
  note: 140,
  /** Characters of Markdown on an opponent or a game. */
  notes: 8000,
  key: 60,
  keys: 3,
  reason: 200,
  reasonSentence: 160,
  jersey: 99,
  periods: 10,
  /** Seconds: the longest a possession may take to be believed. */
  seconds: 60,
  traps: 6,
  track: 60,
  stillBytes: 12 * 1024 * 1024,
  stillsAPossession: 24,
  /** Longest edge of a stored still, px. */
  stillEdge: 2560,
  thumbnailEdge: 480,
  /** More pixels than any phone makes; a small file that unpacks past this is refused as a bomb. */
  stillPixels: 64_000_000,
  jsonBytes: 256 * 1024,
  pageRows: 200,
  undoMinutes: 10,
  /** Longest words on a still. */
  stillWords: 8,
  batchRows: 200,
  /** Possessions kept with a signed plan for one habit: more than a season of one opponent has. */
  groundRows: 2000,
  invitationDays: 7,
  resetMinutes: 60,
  mailTries: 6,
  practiceMinutes: 240,
} as const

export const STILL_TYPES = ['image/jpeg', 'image/png', 'image/webp'] as const

/** The default player sheet (design section 4): words without names, drawings, points, smallest body in pt. */
export const SHEET_BUDGET = { words: 120, drawings: 2, points: 3, bodyPt: 14 } as const
