/** Now, as an argument: tests and the demo choose the day. */
export type Clock = () => Date

export const systemClock: Clock = () => new Date()
