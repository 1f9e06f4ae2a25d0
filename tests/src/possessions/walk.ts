import { rulePack } from '@shared/court/rulePacks'
import { answersOf } from '@/views/possessions/answers'
import { applyAct, newLine, stepBack, type Line } from '@/views/possessions/line'
import { textOf } from '@/views/possessions/parts'
import { sentenceOf } from '@/views/possessions/sentence'

export const FIBA = rulePack('fiba')
export const GAME = '6f1f7c9e-3f53-4a9e-9a53-0d1f6f0b7f10'
export const ROW = '0b0c7c0e-8a8e-4d58-9d5f-1d9a3a1f0a01'

export const fresh = (): Line => newLine(ROW, GAME, [])

/** Presses keys as a scout would; '<' is Backspace. */
export function press(line: Line, keys: string): Line {
  return keys.split(' ').reduce((now, key) => {
    if (key === '<') return stepBack(now)
    const answer = answersOf(now, FIBA).find((each) => each.key === key)
    if (answer === undefined) throw new Error(`nothing answers to ${key}: ${said(now)}`)
    return applyAct(now, answer.act)
  }, line)
}

export const said = (line: Line): string => textOf(sentenceOf(line))
export const keysOf = (line: Line): string =>
  answersOf(line, FIBA)
    .map((answer) => answer.key)
    .join(' ')
