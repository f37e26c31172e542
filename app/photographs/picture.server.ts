import sharp from 'sharp'
import { PHOTOGRAPH_LIMITS } from '#app/care/photographs.ts'

// Of everything the library can read, such as SVG with what it fetches, only these three are let in.
sharp.block({ operation: ['VipsForeignLoad'] })
sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadWebp'] })
sharp.cache(false)
sharp.concurrency(1)

const LARGE_PX = 2400
const SMALL_PX = 320
const QUALITY = 82

/** A photograph drawn anew from its pixels: nothing of the file it came in is left. */
export interface Picture {
  readonly large: Buffer
  readonly small: Buffer
  readonly width: number
  readonly height: number
}

/** A photograph, or why the file is none, as words to say at the field. */
export type Reading = { readonly ok: true; readonly picture: Picture } | { readonly ok: false; readonly why: string }

const refused = (why: string): Reading => ({ ok: false, why })

let last: Promise<unknown> = Promise.resolve()

/** Reads a file that somebody sent, one at a time: a large picture takes memory while it is open. */
export function readPicture(bytes: Uint8Array): Promise<Reading> {
  const reading = last.then(() => read(bytes))
  last = reading.catch(() => undefined)
  return reading
}

async function read(bytes: Uint8Array): Promise<Reading> {
  if (bytes.byteLength === 0) return refused('is empty')
  if (bytes.byteLength > PHOTOGRAPH_LIMITS.bytes) return refused('is larger than 8 MB')
  if (!isKnownType(bytes)) return refused('is no JPEG, PNG or WebP photograph')
  try {
    return await drawnAnew(bytes)
  } catch (error) {
    // The library says of any broken file that it is an Error, and nothing more exact.
    if (error instanceof Error) return refused('is damaged, or no photograph')
    throw error
  }
}

async function drawnAnew(bytes: Uint8Array): Promise<Reading> {
  const options = { limitInputPixels: PHOTOGRAPH_LIMITS.pixels, failOn: 'warning', pages: 1 } as const
  const { width, height, pages = 1 } = await sharp(bytes, { ...options, limitInputPixels: false }).metadata()
  if (pages > 1) return refused('is a moving picture: choose a still one')
  if (width * height > PHOTOGRAPH_LIMITS.pixels) return refused('has more than 40 megapixels')
  const upright = sharp(bytes, options).autoOrient().toColourspace('srgb').flatten({ background: 'white' })
  const large = await upright
    .resize({ width: LARGE_PX, height: LARGE_PX, fit: 'inside', withoutEnlargement: true })
    .webp({ quality: QUALITY })
    .toBuffer({ resolveWithObject: true })
  const small = await sharp(large.data)
    .resize({ width: SMALL_PX, height: SMALL_PX, fit: 'inside', withoutEnlargement: true })
    .webp({ quality: QUALITY })
    .toBuffer()
  const size = { width: large.info.width, height: large.info.height }
  return { ok: true, picture: { large: large.data, small, ...size } }
}

/** By the first bytes of the file; its name and what the browser says of it may be anything. */
function isKnownType(bytes: Uint8Array): boolean {
  const head = Buffer.from(bytes.subarray(0, 12)).toString('latin1')
  return head.startsWith('\xff\xd8\xff') || head.startsWith('\x89PNG\r\n\x1a\n') || /^RIFF.{4}WEBP/s.test(head)
}
