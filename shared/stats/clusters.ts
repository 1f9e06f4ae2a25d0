/** Rows of one game: k of n. */
export interface Count {
  k: number
  n: number
}

/** Weight of a game so many games old (0 is the newest): halved every `halfLife` games. */
export function recencyWeight(gamesAgo: number, halfLife: number): number {
  return 0.5 ** (gamesAgo / halfLife)
}

/**
 * How much rows of one game resemble each other: the intraclass correlation by the one-way ANOVA
 * estimator, bounded to 0..1. Each element is a game. 0 where it cannot be told: fewer than two games,
 * no game with two rows, or no spread at all.
 */
export function intraclass(games: readonly Count[]): number {
  const played = games.filter((game) => game.n > 0)
  const groups = played.length
  const n = played.reduce((sum, game) => sum + game.n, 0)
  if (groups < 2 || n <= groups) return 0
  const mean = played.reduce((sum, game) => sum + game.k, 0) / n
  const between = played.reduce((sum, game) => sum + game.n * (game.k / game.n - mean) ** 2, 0) / (groups - 1)
  const within = played.reduce((sum, game) => sum + (game.k * (game.n - game.k)) / game.n, 0) / (n - groups)
  const size = (n - played.reduce((sum, game) => sum + game.n ** 2, 0) / n) / (groups - 1)
  const spread = between + (size - 1) * within
  return spread <= 0 ? 0 : Math.min(1, Math.max(0, (between - within) / spread))
}

/**
 * What n is divided by because games are clusters: 1 + (mean rows a game - 1) x ICC (RECORD.md
 * section 4). Never under 1. `rows` holds the number of rows of each game.
 */
export function designEffect(rows: readonly number[], icc: number): number {
  const played = rows.filter((n) => n > 0)
  if (played.length === 0) return 1
  const mean = played.reduce((sum, n) => sum + n, 0) / played.length
  return Math.max(1, 1 + (mean - 1) * icc)
}

/** n as if its rows were independent. */
export function clusterDeflate(n: number, rows: readonly number[], icc: number): number {
  return n / designEffect(rows, icc)
}
