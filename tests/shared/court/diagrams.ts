import { Diagram } from '@shared/court/diagram'

const stand = (places: Record<string, [number, number]>) =>
  Object.entries(places).map(([role, [x, y]]) => ({ role, at: { x, y } }))

const theirs = [
  [0.02, 0.6],
  [0.2, 0.3],
  [0.2, 0.7],
  [0.42, 0.5],
  [0.62, 0.5],
].map(([x, y], i) => ({ id: `X${i + 1}`, at: { x, y } }))

/** Four across the foul line: a throw-in off a screen, the middle, the dribble over half, a pass ahead. */
export const ACROSS = Diagram.parse({
  version: 1,
  frame: 1,
  start: {
    ours: stand({ 5: [-0.03, 0.68], 1: [0.22, 0.36], 2: [0.22, 0.62], 3: [0.22, 0.88], 4: [0.22, 0.12] }),
    theirs,
    ball: '5',
  },
  steps: [
    {
      title: 'Sprint',
      moves: [
        { kind: 'cut', who: '4', to: { x: 0.5, y: 0.06 }, bend: -0.2 },
        { kind: 'cut', who: '3', to: { x: 0.5, y: 0.93 }, bend: 0.2 },
      ],
    },
    {
      title: 'Guard screens guard',
      moves: [
        { kind: 'screen', who: '2', to: { x: 0.21, y: 0.42 }, for: '1' },
        { kind: 'cut', who: '1', to: { x: 0.13, y: 0.66 }, bend: 0.35, beat: 1 },
        { kind: 'pass', from: '5', to: '1', throwIn: true, beat: 1 },
      ],
    },
    {
      title: 'Ball to the middle',
      moves: [
        { kind: 'cut', who: '2', to: { x: 0.36, y: 0.5 } },
        { kind: 'cut', who: '5', to: { x: 0.06, y: 0.42 } },
        { kind: 'pass', from: '1', to: '2' },
      ],
    },
    {
      title: 'Fill the lanes',
      moves: [
        { kind: 'dribble', who: '2', to: { x: 0.59, y: 0.5 } },
        { kind: 'cut', who: '3', to: { x: 0.86, y: 0.76 } },
        { kind: 'pass', from: '2', to: '3', beat: 1 },
      ],
    },
  ],
})

/** The same diagram with some of it changed, as a hand that draws would. */
export function changed(change: (raw: Diagram) => void): Diagram {
  const raw = structuredClone(ACROSS)
  change(raw)
  return Diagram.parse(raw)
}
