import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { ReadableStream } from 'node:stream/web'
import busboy from 'busboy'

/** How much of a form is kept while it arrives. What is past it is read and let go, so that no form fills the memory. */
export interface FormLimits {
  /** Of each file; one byte more is kept, which tells that it was longer. */
  readonly fileBytes: number
  /** Further ones are kept empty: their number tells that there were too many. */
  readonly files: number
  /** Of all that was typed, together. */
  readonly textBytes: number
}

/** What was typed is longer than any form needs. */
export class TooMuchText extends Error {
  override readonly name = 'TooMuchText'
}

const MOST_PARTS = 1000 // the longest form has about a hundred fields

/**
 * Reads a form of several parts as it arrives (RFC 7578). Unlike the platform's own reader it never holds more than the limits
 * allow: a file that is too large comes cut off, and everything typed beside it comes whole. Throws a TypeError for a body that
 * is no such form, or ends too early.
 */
export async function multipartForm(request: Request, limits: FormLimits): Promise<FormData> {
  const parser = parserOf(request, limits)
  const parts = partsOf(parser, limits)
  try {
    await pipeline(Readable.fromWeb((request.body ?? emptyBody()) as ReadableStream), parser)
  } catch (cause) {
    throw cause instanceof TooMuchText ? cause : new TypeError('A form that cannot be read', { cause })
  }
  const form = new FormData()
  for (const part of parts) form.append(part.name, 'value' in part ? part.value : fileOf(part))
  return form
}

const emptyBody = () => new Blob([]).stream()

function parserOf(request: Request, { fileBytes, textBytes }: FormLimits): busboy.Busboy {
  try {
    return busboy({
      headers: { 'content-type': request.headers.get('Content-Type') ?? '' },
      defParamCharset: 'utf8',
      preservePath: true,
      limits: { fileSize: fileBytes + 1, fieldSize: textBytes + 1, parts: MOST_PARTS },
    })
  } catch (cause) {
    throw new TypeError('A form without a boundary', { cause })
  }
}

type Part =
  | { readonly name: string; readonly value: string }
  | { readonly name: string; readonly file: string; readonly type: string; readonly kept: Uint8Array<ArrayBuffer>[] }

/** The parts as they come, in their order. */
function partsOf(parser: busboy.Busboy, limits: FormLimits): readonly Part[] {
  const parts: Part[] = []
  let [files, textBytes] = [0, 0]
  parser.on('field', (name, value) => {
    textBytes += Buffer.byteLength(value)
    if (textBytes > limits.textBytes) parser.destroy(new TooMuchText())
    parts.push({ name: written(name), value })
  })
  parser.on('file', (name, stream, { filename, mimeType }) => {
    const part = { name: written(name), file: written(filename), type: mimeType, kept: [] as Uint8Array<ArrayBuffer>[] }
    if (part.file !== '') files += 1
    const isKept = files <= limits.files
    // Copied: a part of a chunk would keep the whole chunk in memory.
    stream.on('data', (bytes: Buffer) => isKept && part.kept.push(new Uint8Array(bytes)))
    parts.push(part)
  })
  parser.on('partsLimit', () => parser.destroy(new TooMuchText()))
  return parts
}

function fileOf({ file, type, kept }: Extract<Part, { readonly file: string }>): File {
  return new File(kept, file, { type })
}

/** Browsers write quotation marks and line breaks in a name as %22, %0D and %0A. */
function written(name: string | undefined): string {
  return (name ?? '').replace(/%(22|0D|0A)/gi, code => decodeURIComponent(code))
}
