import sharp, { type Sharp } from 'sharp'
import { LIMITS } from '@shared/limits'
import type { Region } from '@shared/stills/marks'
import { mosaic } from './mosaic'

/** A still ready to be kept: upright, without metadata, no edge over the limits; JPEG. */
export interface PreparedPicture {
  full: Buffer
  thumbnail: Buffer
  /** px of the full picture. */
  width: number
  height: number
}

/** Why a picture is refused; the route turns it into words for the coach. */
export class PictureRefused extends Error {
  constructor(readonly why: 'not-an-image' | 'too-many-pixels') {
    super(why)
  }
}

const text = (bytes: Buffer, from: number, to: number) => bytes.toString('latin1', from, to)

/** JPEG, PNG or WebP by its first bytes: no other reader of the library ever sees what was sent. */
function isTaken(bytes: Buffer): boolean {
  return (
    text(bytes, 0, 3) === '\xff\xd8\xff' ||
    text(bytes, 0, 8) === '\x89PNG\r\n\x1a\n' ||
    (text(bytes, 0, 4) === 'RIFF' && text(bytes, 8, 12) === 'WEBP')
  )
}

/**
 * Checks, turns upright, strips metadata and shrinks an uploaded picture. What counts is what the bytes
 * are, never the name or the type that came with them.
 * @throws PictureRefused
 */
export async function preparePicture(upload: Buffer): Promise<PreparedPicture> {
  if (!isTaken(upload)) throw new PictureRefused('not-an-image')
  const options = { limitInputPixels: LIMITS.stillPixels, failOn: 'error', pages: 1 } as const
  const meta = await sharp(upload, { ...options, limitInputPixels: false })
    .metadata()
    .catch(() => null)
  if (!meta?.width || !meta.height) throw new PictureRefused('not-an-image')
  if (meta.width * meta.height > LIMITS.stillPixels) throw new PictureRefused('too-many-pixels')
  try {
    return await bothSizes(() => sharp(upload, options).rotate())
  } catch {
    throw new PictureRefused('not-an-image')
  }
}

/** Both sizes of a picture, each from a reader of its own. */
async function bothSizes(read: () => Sharp): Promise<PreparedPicture> {
  const sized = (edge: number, quality: number) =>
    read()
      .resize({ width: edge, height: edge, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality, mozjpeg: true })
      .toBuffer({ resolveWithObject: true })
  const full = await sized(LIMITS.stillEdge, 84)
  const thumbnail = await sized(LIMITS.thumbnailEdge, 78)
  return { full: full.data, thumbnail: thumbnail.data, width: full.info.width, height: full.info.height }
}

/** A kept picture with parts of it burned away; the thumbnail is made from what is left, never from before. */
export async function blurPicture(full: Buffer, regions: readonly Region[]): Promise<PreparedPicture> {
  const { data, info } = await sharp(full).raw().toBuffer({ resolveWithObject: true })
  const { width, height, channels } = info
  for (const region of regions) mosaic({ data, width, height, channels }, region)
  return bothSizes(() => sharp(data, { raw: { width, height, channels } }))
}
