/**
 * Does the same for each of many, one after another, and goes on where it fails for one: whatever is wrong with
 * that one must not keep the others.
 * @throws the first fault, once all have had their turn
 */
export async function eachAlone<T>(list: readonly T[], work: (one: T) => Promise<unknown>): Promise<void> {
  const faults: unknown[] = []
  for (const one of list)
    await work(one).catch((error: unknown) => {
      faults.push(error)
    })
  if (faults.length > 0) throw faults[0]
}
