import sharp from 'sharp'
import { toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { seeded, type Random } from '../random'
import { cameraAt, type Camera, type Vec } from './camera'
import { figure, type Kit, type Pose } from './figures'
import { basket, boards, crowd, floor } from './hall'

export interface StillPlayer {
  /** Fractions of the court, as everywhere (RECORD.md section 2). */
  x: number
  y: number
  kit: Kit
  pose: Pose
}

/** An invented frame of film: where the camera looks and who stands where. */
export interface StillSpec {
  seed: number
  look: { x: number; y: number }
  /** 1 is a wide picture of a third of the floor; 2 is twice as near. */
  zoom: number
  players: StillPlayer[]
  /** What a scout would mark on it, as places on the floor: whom they trap, the room they leave, the way out. */
  ring: Place | null
  room: Place | null
  pass: { from: Place; to: Place } | null
}

export interface Place {
  x: number
  y: number
}

export const WIDTH = 1600
export const HEIGHT = 900
/** Where the film camera stands: up in the seats behind the right sideline. */
const CAMERA = { back: 5.2, high: 3.3 }
const FIBA = rulePack('fiba')

export const metres = (place: Place) => {
  const { x, y } = toMetres(FIBA, { x: place.x, y: place.y })
  return { x, y }
}

/** The camera of a spec; the first that its random numbers decide. */
export function cameraOf(spec: StillSpec, random: Random): Camera {
  const target = metres(spec.look)
  const from: Vec = [target.x + random.between(1.5, 3), FIBA.court.width + CAMERA.back, CAMERA.high]
  return cameraAt(from, [target.x, target.y, 1.05], 0.95 * spec.zoom, WIDTH, HEIGHT)
}

/** Draws a still: grey, 1600 by 900, JPEG; the same bytes for the same spec on one version of sharp. */
export async function renderStill(spec: StillSpec): Promise<Buffer> {
  const random = seeded(spec.seed)
  const camera = cameraOf(spec, random)
  const stands = crowd(camera, random)
  const players = spec.players
    .map((player) => ({ ...player, ...metres(player) }))
    .sort((a, b) => a.y - b.y || a.x - b.x)
    .map((player) => figure(camera, player, player.kit, player.pose, random))
  const hall = svg(
    `<defs><linearGradient id="floor" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#a09f9c"/><stop offset="1" stop-color="#cfcdc8"/></linearGradient>` +
      `<radialGradient id="dim" cx=".5" cy=".52" r=".75"><stop offset=".55" stop-color="#000" stop-opacity="0"/><stop offset="1" stop-color="#000" stop-opacity=".34"/></radialGradient>` +
      `</defs>` +
      floor(camera) +
      boards(camera) +
      basket(camera) +
      players.join('') +
      `<rect width="100%" height="100%" fill="url(#dim)"/>`,
  )
  // Drawn small and pulled up, the stands are out of focus as on film.
  const far = await sharp(svg(`<rect width="100%" height="100%" fill="#1b1b1d"/>${stands}`, 1 / 3))
    .flatten()
    .resize(WIDTH, HEIGHT, { kernel: 'cubic' })
    .raw()
    .toBuffer()
  const both = await sharp(far, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
    .composite([{ input: hall }])
    .removeAlpha()
    .raw()
    .toBuffer()
  const pixels = await sharp(both, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
    .blur(0.8)
    .toColourspace('b-w')
    .raw()
    .toBuffer()
  return sharp(grained(pixels, spec.seed), { raw: { width: WIDTH, height: HEIGHT, channels: 1 } })
    .toColourspace('b-w')
    .jpeg({ quality: 74 })
    .toBuffer()
}

const svg = (body: string, size = 1) =>
  Buffer.from(
    `<svg xmlns="http://www.w3.org/2000/svg" width="${Math.round(WIDTH * size)}" height="${Math.round(HEIGHT * size)}" viewBox="0 0 ${WIDTH} ${HEIGHT}">${body}</svg>`,
  )

/** Film grain: every pixel a little lighter or darker. One byte a pixel. */
function grained(pixels: Buffer, seed: number): Buffer {
  const random = seeded(seed ^ 0x5eed)
  return pixels.map((value) => Math.max(0, Math.min(255, value + (random.next() - 0.5) * 20))) as Buffer
}
