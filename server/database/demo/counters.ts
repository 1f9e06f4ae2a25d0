import { anchor } from './counters/anchor'
import { box } from './counters/box'
import { clear } from './counters/clear'
import { echo } from './counters/echo'
import { home } from './counters/home'
import { island } from './counters/island'
import { kite } from './counters/kite'
import { ladder } from './counters/ladder'
import { middleThree } from './counters/middleThree'
import { oneFour } from './counters/oneFour'
import { rail } from './counters/rail'
import { stack } from './counters/stack'
import { tower } from './counters/tower'
import { twoUp } from './counters/twoUp'
import type { DemoCounter } from './counters/types'
import { windowBox } from './counters/windowBox'
import { zigzag } from './counters/zigzag'

/** The invented club's library: sixteen counters over all ten families, each drawn against the press it beats. */
export const DEMO_COUNTERS: DemoCounter[] = [
  oneFour,
  box,
  stack,
  twoUp,
  middleThree,
  clear,
  ladder,
  home,
  rail,
  zigzag,
  tower,
  windowBox,
  kite,
  anchor,
  echo,
  island,
]
