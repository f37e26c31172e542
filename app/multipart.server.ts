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

const LONGEST_HEAD = 8192
const END_OF_HEAD = Buffer.from('\r\n\r\n')

/**
 * Reads a form of several parts as it arrives (RFC 7578). Unlike the platform's own reader it never holds more than the limits
 * allow: a file that is too large comes cut off, and everything typed beside it comes whole. Throws a TypeError for a body that
 * is no such form, or ends too early.
 */
export async function multipartForm(request: Request, limits: FormLimits): Promise<FormData> {
  const boundary = /;\s*boundary=(?:"([^"]+)"|([^;\s]+))/i.exec(request.headers.get('Content-Type') ?? '')
  if (!boundary || !request.body) throw new TypeError('A form without a boundary')
  const delimiter = Buffer.from(`\r\n--${boundary[1] ?? boundary[2]}`)
  const parts = new Parts(limits)
  let rest: Buffer = Buffer.from('\r\n') // before the first boundary there may be nothing
  let inHead = false
  for await (const chunk of chunksOf(request.body)) {
    rest = Buffer.concat([rest, chunk])
    for (let isGoingOn = !parts.isWhole; isGoingOn; ) {
      const step: Step = inHead ? headStep(rest, parts) : bodyStep(rest, delimiter, parts)
      ;({ rest, inHead, isGoingOn } = step)
    }
    if (parts.isWhole) rest = Buffer.alloc(0)
  }
  if (!parts.isWhole) throw new TypeError('A form that ends too early')
  return parts.form
}

interface Step {
  readonly rest: Buffer
  readonly inHead: boolean
  readonly isGoingOn: boolean
}

/** A part's body up to the next boundary, or as much of it as surely is none. */
function bodyStep(rest: Buffer, delimiter: Buffer, parts: Parts): Step {
  const at = rest.indexOf(delimiter)
  if (at < 0) {
    const sure = Math.max(0, rest.length - delimiter.length)
    parts.take(rest.subarray(0, sure))
    return { rest: rest.subarray(sure), inHead: false, isGoingOn: false }
  }
  const after = rest.subarray(at + delimiter.length)
  if (after.length < 2) return { rest, inHead: false, isGoingOn: false }
  parts.take(rest.subarray(0, at))
  parts.end()
  const mark = after.toString('latin1', 0, 2)
  if (mark === '--') parts.isWhole = true
  else if (mark !== '\r\n') throw new TypeError('A boundary that does not end')
  return { rest: after.subarray(2), inHead: true, isGoingOn: mark !== '--' }
}

function headStep(rest: Buffer, parts: Parts): Step {
  const end = rest.indexOf(END_OF_HEAD)
  if (end < 0) {
    if (rest.length > LONGEST_HEAD) throw new TypeError('A part whose head does not end')
    return { rest, inHead: true, isGoingOn: false }
  }
  parts.begin(rest.toString('utf8', 0, end))
  return { rest: rest.subarray(end + END_OF_HEAD.length), inHead: false, isGoingOn: true }
}

/** The parts of a form so far. */
class Parts {
  readonly form = new FormData()
  isWhole = false
  private part: {
    name: string
    file: string | undefined
    type: string
    kept: Uint8Array<ArrayBuffer>[]
    bytes: number
  } | null = null
  private files = 0
  private textBytes = 0

  constructor(private readonly limits: FormLimits) {}

  begin(head: string): void {
    const name = parameterOf(head, 'name')
    if (name === undefined) throw new TypeError('A part without a name')
    const [, type = 'application/octet-stream'] = /^content-type:\s*([^\r\n]+)/im.exec(head) ?? []
    this.part = { name, file: parameterOf(head, 'filename'), type: type.trim(), kept: [], bytes: 0 }
    if (this.part.file !== undefined && this.part.file !== '') this.files += 1
  }

  take(bytes: Buffer): void {
    const { part, limits } = this
    if (!part || bytes.length === 0) return
    const isText = part.file === undefined
    if (isText) this.textBytes += bytes.length
    if (this.textBytes > limits.textBytes) throw new TooMuchText()
    const most = isText ? limits.textBytes : this.files > limits.files ? 0 : limits.fileBytes + 1
    const kept = bytes.subarray(0, most - part.bytes)
    part.bytes += kept.length
    // Copied: a part of a chunk would keep the whole chunk in memory.
    if (kept.length > 0) part.kept.push(new Uint8Array(kept))
  }

  end(): void {
    if (!this.part) return
    const { name, file, type, kept } = this.part
    if (file === undefined) this.form.append(name, Buffer.concat(kept).toString('utf8'))
    else this.form.append(name, new File(kept, file, { type }))
    this.part = null
  }
}

/** A parameter of `Content-Disposition`; browsers write quotation marks and line breaks in it as %22, %0D and %0A. */
function parameterOf(head: string, name: string): string | undefined {
  const line = /^content-disposition:[^\r\n]*/im.exec(head)?.[0] ?? ''
  const value = new RegExp(`;\\s*${name}="([^"]*)"`, 'i').exec(line)?.[1]
  return value?.replace(/%(22|0D|0A)/gi, code => decodeURIComponent(code))
}

/** A body that breaks off is a form that breaks off, whatever the platform calls it. */
async function* chunksOf(body: ReadableStream<Uint8Array>): AsyncGenerator<Uint8Array> {
  const reader = body.getReader()
  for (;;) {
    const { done, value } = await reader.read().catch((cause: unknown) => {
      throw new TypeError('A form that did not arrive', { cause })
    })
    if (done) return
    yield value
  }
}
