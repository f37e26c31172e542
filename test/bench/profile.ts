import { mkdirSync, readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Side } from './figures.ts'
import { askMany } from './requests.ts'
import { served } from './servers.ts'

interface CpuProfile {
  readonly nodes: readonly { readonly id: number; readonly callFrame: CallFrame }[]
  readonly samples: readonly number[]
  readonly timeDeltas: readonly number[]
  readonly startTime: number
}
interface CallFrame {
  readonly functionName: string
  readonly url: string
  readonly lineNumber: number
}

const SHOWN = 20

/**
 * Where the server's main thread spends its time on the requests of one side: shares by part of the program, then by function.
 * `begun` gives the side on a server that is started for the profile. The file stays in `folder`.
 */
export async function profiled(
  name: string,
  {
    folder,
    env,
    sideOn,
  }: { folder: string; env: NodeJS.ProcessEnv; sideOn: (server: Awaited<ReturnType<typeof served>>) => Side },
): Promise<string> {
  const place = join(folder, name.replaceAll(/\W+/g, '-').toLowerCase())
  mkdirSync(place, { recursive: true })
  const server = await served('server.ts', env, ['--cpu-prof', `--cpu-prof-dir=${place}`])
  const { begin, requests, status } = sideOn(server)
  const many = async (count: number) => askMany(server.port, { count, status, next: await begin() })
  await many(requests)
  const from = microseconds()
  await many(2 * requests)
  const to = microseconds()
  await server.stop()
  return `${name}, self time of the main thread (${place}):\n${shares(mainProfile(place), from, to)}`
}

/** The clock of a profile: the machine's, which only runs forward. */
function microseconds(): number {
  return Number(process.hrtime.bigint() / 1000n)
}

/** The profile with the most samples outside idleness: the other files are of the threads that load TypeScript and hash. */
function mainProfile(place: string): CpuProfile {
  const profiles = readdirSync(place).map(file => JSON.parse(readFileSync(join(place, file), 'utf8')) as CpuProfile)
  const [main] = profiles.toSorted((a, b) => b.nodes.length - a.nodes.length)
  if (!main) throw new Error('The server wrote no profile')
  return main
}

function shares({ nodes, samples, timeDeltas, startTime }: CpuProfile, from: number, to: number): string {
  const frames = new Map(nodes.map(({ id, callFrame }) => [id, callFrame]))
  const [parts, functions] = [new Map<string, number>(), new Map<string, number>()]
  let [at, total] = [startTime, 0]
  for (const [index, id] of samples.entries()) {
    const took = timeDeltas[index] ?? 0
    at += took
    const frame = frames.get(id)
    if (at < from || at > to || !frame || frame.functionName === '(idle)') continue
    total += took
    const part = partOf(frame)
    add(parts, part, took)
    add(functions, `${frame.functionName || '(unnamed)'}  ${part}:${frame.lineNumber + 1}`, took)
  }
  const lines = (sums: ReadonlyMap<string, number>) =>
    [...sums]
      .toSorted((a, b) => b[1] - a[1])
      .slice(0, SHOWN)
      .map(([what, took]) => `${((100 * took) / total).toFixed(1).padStart(6)} %  ${what}`)
  return [...lines(parts).slice(0, 12), '', ...lines(functions)].join('\n')
}

function add(sums: Map<string, number>, name: string, amount: number) {
  sums.set(name, (sums.get(name) ?? 0) + amount)
}

/** A package, the application itself, Node.js, or what V8 names in brackets. */
function partOf({ url, functionName }: CallFrame): string {
  const packaged = /node_modules\/((?:@[^/]+\/)?[^/]+)/.exec(url)?.[1]
  if (packaged) return packaged
  if (url.includes('/build/server/')) return 'application'
  if (url.startsWith('node:')) return 'node'
  return url === '' ? functionName : url.replace(/^.*\//, '')
}
