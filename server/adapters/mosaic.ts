import type { Region } from '@shared/stills/marks'

/** Pixels without packing: rows from the top, `channels` bytes each. */
export interface Raw {
  data: Buffer
  width: number
  height: number
  channels: number
}

/** Blocks along each side of a part: few enough that no face can be made out of them. */
const BLOCKS = 4

/**
 * Overwrites a part of a picture, in place, with 4 x 4 blocks of one colour each, the mean of what was under it.
 * Edges are rounded outwards: no pixel that the part touches stays.
 */
export function mosaic(raw: Raw, { x, y, w, h }: Region): void {
  const left = Math.max(0, Math.floor(x * raw.width))
  const top = Math.max(0, Math.floor(y * raw.height))
  const right = Math.min(raw.width, Math.ceil((x + w) * raw.width))
  const bottom = Math.min(raw.height, Math.ceil((y + h) * raw.height))
  const cut = (from: number, to: number, at: number) => Math.round(from + ((to - from) * at) / BLOCKS)
  for (let row = 0; row < BLOCKS; row++)
    for (let column = 0; column < BLOCKS; column++)
      flatten(raw, {
        left: cut(left, right, column),
        right: cut(left, right, column + 1),
        top: cut(top, bottom, row),
        bottom: cut(top, bottom, row + 1),
      })
}

interface Block {
  left: number
  top: number
  right: number
  bottom: number
}

/** One colour over a block; an empty block is none. */
function flatten({ data, width, channels }: Raw, { left, top, right, bottom }: Block): void {
  const pixels = (right - left) * (bottom - top)
  if (pixels <= 0) return
  for (let channel = 0; channel < channels; channel++) {
    let sum = 0
    for (let y = top; y < bottom; y++)
      for (let x = left; x < right; x++) sum += data[(y * width + x) * channels + channel] ?? 0
    const mean = Math.round(sum / pixels)
    for (let y = top; y < bottom; y++)
      for (let x = left; x < right; x++) data[(y * width + x) * channels + channel] = mean
  }
}
