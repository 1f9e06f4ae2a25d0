/**
 * A first-come, first-served lock. SQLite has one writer and we have one connection, so a transaction
 * must have the connection to itself from BEGIN to COMMIT.
 */
export class Lock {
  private tail: Promise<void> = Promise.resolve()

  /** Waits for its turn; the returned function hands the lock on and may be called once. */
  async acquire(): Promise<() => void> {
    let release: () => void = () => undefined
    const before = this.tail
    this.tail = new Promise((resolve) => {
      release = resolve
    })
    await before
    return release
  }
}
