import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { changesOf } from '#database/record-changes.server.ts'
import { bedMovesOf, type Stay, staysOf } from '#database/stays.server.ts'
import { changeViews } from './change-words.ts'

const shown = (at: Date) => showDateTime(at, env.hospitalTimeZone)

/** What became of a patient besides their care, as it is shown: beds of this stay, all stays, and who changed what. */
export async function patientHistory({ id: stayId, patientId }: Stay) {
  const [moves, stays, changes] = await Promise.all([
    bedMovesOf(stayId),
    staysOf(patientId),
    changesOf([patientId, stayId]),
  ])
  return {
    beds: moves.map(move => ({
      key: shown(move.movedAt) + move.bedLabel,
      since: shown(move.movedAt),
      bed: `${move.wardName}, bed ${move.bedLabel}`,
      by: move.recordedByName,
    })),
    stays: stays.map(stay => ({
      key: stay.id,
      admitted: shown(stay.admittedAt),
      discharged: stay.dischargedAt ? shown(stay.dischargedAt) : 'Here now',
      ward: stay.wardName,
      destination: [stay.dischargeReason, stay.dischargeNote].filter(Boolean).join('. '),
    })),
    changes: changeViews(changes, env.hospitalTimeZone),
  }
}
