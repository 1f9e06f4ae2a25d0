import { deflateSync, crc32 } from 'node:zlib'
import sharp from 'sharp'

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const length = Buffer.alloc(4)
  length.writeUInt32BE(data.length)
  const check = Buffer.alloc(4)
  check.writeUInt32BE(crc32(body))
  return Buffer.concat([length, body, check])
}

/** A whole, valid one-bit PNG of any size in pixels; a few kB of zeros that unpack to width x height. */
export function bombPng(width: number, height: number): Buffer {
  const header = Buffer.alloc(13)
  header.writeUInt32BE(width, 0)
  header.writeUInt32BE(height, 4)
  header.set([1, 0, 0, 0, 0], 8)
  const rows = Buffer.alloc((Math.ceil(width / 8) + 1) * height)
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(rows, { level: 9 })),
    chunk('IEND', Buffer.alloc(0)),
  ])
}

/** Left half red, right half blue, as a JPEG lying on its side: a viewer has to turn it a quarter right. */
export async function sidewaysJpeg(width: number, height: number): Promise<Buffer> {
  const half = await sharp({
    create: { width: Math.round(width / 2), height, channels: 3, background: '#0000ff' },
  })
    .png()
    .toBuffer()
  return sharp({ create: { width, height, channels: 3, background: '#ff0000' } })
    .composite([{ input: half, left: width - Math.round(width / 2), top: 0 }])
    .jpeg()
    .withExif({
      IFD0: { Orientation: '6', Copyright: 'Zeldas phone', Make: 'Pocketcam' },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '51/1 30/1 0/1',
        GPSLongitudeRef: 'W',
        GPSLongitude: '0/1 7/1 0/1',
      },
    })
    .withMetadata({ orientation: 6 })
    .toBuffer()
}

/** Bytes that no packer makes smaller, so that a file is as large as it is told to be. */
export function noise(bytes: number): Buffer {
  const out = Buffer.alloc(bytes)
  let state = 1
  for (let index = 0; index < bytes; index++) {
    state = (state * 1_103_515_245 + 12_345) & 0x7fffffff
    out[index] = state >> 16
  }
  return out
}
