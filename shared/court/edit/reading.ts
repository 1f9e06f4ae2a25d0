/** Something in a file that cannot be taken, and where: a path such as "diagram.steps.2". */
export interface Refusal {
  field: string
  message: string
}

/** What was changed while reading, and what could not be read. */
export class Reading {
  readonly mended: string[] = []
  readonly refused: Refusal[] = []

  mend(sentence: string): void {
    if (!this.mended.includes(sentence)) this.mended.push(sentence)
  }

  refuse(field: string, message: string): void {
    this.refused.push({ field, message })
  }
}

export type Fields = Readonly<Record<string, unknown>>

/** The fields of an object; null for anything else. Only its own fields are read. */
export function fieldsOf(value: unknown): Fields | null {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return null
  return Object.fromEntries(Object.entries(value))
}

export const listOf = (value: unknown): readonly unknown[] | null => (Array.isArray(value) ? value : null)

/** One of a closed list, or null. A number stands for its own text, as in a role of 5. */
export function oneOf<T extends string>(values: readonly T[], value: unknown): T | null {
  const text = typeof value === 'number' ? String(value) : value
  return values.find((one) => one === text) ?? null
}

/** A finite number, or null; text that is one is taken. */
export function numberOf(value: unknown): number | null {
  const number = typeof value === 'string' && value.trim() !== '' ? Number(value) : value
  return typeof number === 'number' && Number.isFinite(number) ? number : null
}

export const clamped = (value: number, least: number, most: number): number =>
  Math.min(most, Math.max(least, value))
