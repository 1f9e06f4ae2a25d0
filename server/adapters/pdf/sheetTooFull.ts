/** More than one page could hold at the smallest type that may be printed. */
export class SheetTooFull extends Error {
  override readonly name = 'SheetTooFull'
  constructor(readonly smallestPt: number) {
    super(`This does not fit on one page, even at ${smallestPt} pt. Use fewer words.`)
  }
}
