/** The few functions used of jstat, which brings no types of its own. */
declare module 'jstat' {
  const jStat: {
    /** Natural logarithm of the gamma function. */
    gammaln(x: number): number
    beta: {
      inv(p: number, alpha: number, beta: number): number
      cdf(x: number, alpha: number, beta: number): number
    }
  }
  export default jStat
}
