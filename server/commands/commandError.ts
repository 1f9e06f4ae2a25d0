/** What a command prints instead of doing its work: each line says what is wrong and what to do. */
export class CommandError extends Error {
  readonly lines: readonly string[]

  constructor(...lines: string[]) {
    super(lines.join('\n'))
    this.lines = lines
  }
}
