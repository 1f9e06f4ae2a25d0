import { box } from './counters/box'
import { clear } from './counters/clear'
import { middleThree } from './counters/middleThree'
import { oneFour } from './counters/oneFour'
import { stack } from './counters/stack'
import { twoUp } from './counters/twoUp'
import type { DemoCounter } from './counters/types'

/** The invented club's library: six counters of six families, each drawn against the press it beats. */
export const DEMO_COUNTERS: DemoCounter[] = [oneFour, box, stack, twoUp, middleThree, clear]
