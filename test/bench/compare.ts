import { median } from 'simple-statistics'
import type { Comparison, Side } from './figures.ts'
import { askMany } from './requests.ts'
import { cpuMs } from './servers.ts'

/** One comparison with what came of it. CPU in ms a request, of the server and the database together. */
export interface Figure {
  readonly name: string
  readonly value: number
  readonly unit: string
  readonly floor: number
  /** Median of the ratios of each round, in which both sides met the same machine. */
  readonly ratio: number
  readonly target: number
  readonly met: boolean
}

/** The median time of an answer with four under way, ours and the floor's, in ms. */
export type Times = readonly [ours: number, floor: number]

const ROUNDS = 15 // short ones, so that what else the machine does meets both sides alike

/** Measures both sides in turn, some rounds long, after both are warm. `database` is the process id of MariaDB. */
export async function compared(comparison: Comparison, database: number): Promise<readonly [Figure, Times]> {
  const { name, target, ours, floor } = comparison
  for (const side of [floor, ours]) await round(side, database)
  const rounds: { ours: Measured; floor: Measured }[] = []
  while (rounds.length < ROUNDS) {
    rounds.push({ floor: await round(floor, database), ours: await round(ours, database) })
  }
  const middle = (pick: (one: (typeof rounds)[number]) => number) => median(rounds.map(pick))
  const ratio = middle(one => one.ours.cpu / one.floor.cpu)
  const [value, floorValue] = [middle(one => one.ours.cpu), middle(one => one.floor.cpu)]
  const figure = { name, value: rounded(value), unit: 'ms CPU a request', floor: rounded(floorValue) }
  return [
    { ...figure, ratio: rounded(ratio), target, met: ratio <= target },
    [middle(one => one.ours.time), middle(one => one.floor.time)],
  ]
}

/** The CPU time in ms of a server on its first request of a kind, when it has yet to read everything. */
export async function firstTime({ server, begin, status }: Side): Promise<number> {
  const before = cpuMs([server.pid])
  await askMany(server.port, { count: 1, status, next: await begin() })
  return cpuMs([server.pid]) - before
}

interface Measured {
  readonly cpu: number
  readonly time: number
}

async function round({ server, status, requests, begin }: Side, database: number): Promise<Measured> {
  const next = await begin()
  const before = cpuMs([server.pid, database])
  const times = await askMany(server.port, { count: requests, status, next })
  return { cpu: (cpuMs([server.pid, database]) - before) / requests, time: median([...times]) }
}

function rounded(value: number): number {
  return Math.round(value * 100) / 100
}
