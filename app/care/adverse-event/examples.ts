import type { AdverseEventData } from './schema.ts'

/** A block that was cleared: the case that other examples vary. */
export const clearedBlock: AdverseEventData = {
  event: 'blocked',
  done: ['help called', 'inner cannula out', 'suction'],
  outcome: 'recovered',
  told: ['charge nurse', 'doctor'],
}

export const adverseEventExamples: readonly AdverseEventData[] = [
  clearedBlock,
  {
    event: 'unplanned removal',
    tubeNow: 'out',
    done: ['help called', 'oxygen'],
    outcome: 'not settled',
    told: ['emergency team'],
    note: 'Turned in bed; ties had come loose.',
  },
  { event: 'displaced', tubeNow: 'in', done: ['tube back'], outcome: 'moved', told: ['doctor', 'family'] },
  { event: 'bleeding', done: ['help called'], outcome: 'not settled', told: ['doctor', 'specialist'] },
  { event: 'valve with cuff up', done: ['valve off'], outcome: 'recovered', told: ['charge nurse'] },
  { event: 'wrong cannula', done: ['nothing'], outcome: 'recovered', told: ['nobody'] },
  { event: 'pressure injury', done: ['pressure off'], outcome: 'recovered', told: ['charge nurse'] },
  { event: 'other', what: 'Oxygen tubing came off', done: ['oxygen'], outcome: 'recovered', told: ['charge nurse'] },
]
