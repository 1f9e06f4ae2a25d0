import type { Problem } from '@shared/http/common'

/** A fault that the server named: RFC 9457 problem details, typed. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem'

  constructor(readonly problem: Problem) {
    super(problem.detail === '' ? problem.title : problem.detail)
  }

  get status(): number {
    return this.problem.status
  }

  /** The fields at fault with our own words about each; empty when the fault is of another kind. */
  get fields(): readonly { field: string; message: string }[] {
    return this.problem.errors ?? []
  }

  /** True when somebody else changed the row first (412) or the id is taken by another row (409). */
  get isConflict(): boolean {
    return this.status === 412 || this.status === 409
  }

  /** The row as it stands now, sent with a 412; parse it with the row's own schema. */
  get current(): unknown {
    return this.problem.current
  }

  /** The message for one field (dotted path), or undefined. */
  fieldMessage(field: string): string | undefined {
    return this.fields.find((fault) => fault.field === field)?.message
  }
}

/** The request never reached the server, or its answer never reached us. Nothing is known to be wrong. */
export class OfflineError extends Error {
  override readonly name = 'OfflineError'

  constructor() {
    super('No signal.')
  }
}

/** The server answered in a form that the shared schemas do not know: an older page against a newer server, or a proxy. */
export class UnreadableAnswer extends Error {
  override readonly name = 'UnreadableAnswer'

  constructor(readonly where: string) {
    super('The answer could not be read. Open this page again.')
  }
}

/** True for the error that an aborted request ends with; it is nobody's trouble. */
export function isAbort(error: unknown): boolean {
  return typeof error === 'object' && error !== null && 'name' in error && error.name === 'AbortError'
}
