import { courtLines } from '@shared/court/courtLines'
import { straight } from '@shared/court/curve'
import { movement } from '@shared/court/movement'
import { penOf } from '@shared/court/pen'
import { pickupFront } from '@shared/court/pressMarks'
import { rulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import { ballAt, ourToken, theirToken, tokenSize } from '@shared/court/tokens'
import { trapZones, zoneBox, type TrapZone } from '@shared/court/trapZones'

/** Metres: the room between the traps in which the form stands, and the part of the court that is shown. */
export const ROOM = { x: 7.1, middle: 7.5, width: 7 } as const
export const SHOWN = { x: -2.35, y: -1.3, width: 30.35, height: 17.6 } as const

const zone = (spot: TrapZone['spot'], side: TrapZone['side'], k: number): TrapZone => ({
  spot,
  side,
  k,
  n: 20,
  thin: false,
})
const ZONES = [
  zone('coffin-corner', 'left', 3),
  zone('coffin-corner', 'right', 11),
  zone('just-over-half', 'left', 2),
  zone('just-over-half', 'right', 6),
]

/** The picture behind the form: our way goes into the room on a pass and comes out on the dribble. */
export function signInScene(): Scene {
  const pack = rulePack('fiba')
  // Drawn half as heavy again as at its true scale: it is seen from further off, behind the form.
  const pen = penOf(34)
  const token = tokenSize(pen, false, 14.7)
  const thrower = { x: -1.2, y: 10.2 }
  const catcher = { x: 3.6, y: 9.4 }
  const beside = 0.5
  const boxes = ZONES.map((each) => zoneBox(pack, each, pen)).filter((box) => box !== null)
  const way = (kind: 'pass' | 'dribble', from: [number, number], to: [number, number]) =>
    movement(kind, straight({ x: from[0], y: from[1] }, { x: to[0], y: to[1] }), pen)
  return {
    view: SHOWN,
    description:
      'The long court. They trap in the four places left and right; between the traps there is room, and our way goes through it.',
    nodes: [
      courtLines(pack, pen),
      trapZones(pack, ZONES, pen, 'screen'),
      pickupFront(pack, 0.036, false, boxes, pen, 'They pick up full court').node,
      {
        kind: 'group',
        id: 'our-way',
        nodes: [
          ...way('pass', [thrower.x + beside, thrower.y - 0.1], [catcher.x - beside, catcher.y + 0.1]),
          ...way('pass', [catcher.x + beside, catcher.y - 0.15], [ROOM.x, 8.2]),
          ...way('dribble', [ROOM.x + ROOM.width + 0.15, 7], [17.4, 7]),
          ...way('pass', [17.7, 7], [26, 7.9]),
        ],
      },
      ...[
        { x: 4.3, y: 5.1 },
        { x: 2.9, y: 12.4 },
        { x: 1.45, y: 13.9 },
        { x: 16.6, y: 12.9 },
        { x: 23.2, y: 11 },
      ].map((at, index) => theirToken(at, String(index), token, pen)),
      ourToken(thrower, '5', false, token, pen),
      ourToken(catcher, '1', false, token, pen),
      ballAt(thrower, token, pen),
    ],
  }
}
