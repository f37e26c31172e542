import type { TaskStatus } from '#app/rules/status.ts'
import type { TagTone } from './tag.tsx'

/** How a status looks wherever it stands. The words beside it always say it too. */
export const toneOf: Readonly<Record<TaskStatus, TagTone>> = {
  upcoming: 'plain',
  'due soon': 'soon',
  due: 'due',
  overdue: 'late',
  'seriously overdue': 'late',
  deferred: 'plain',
  suspended: 'plain',
}

/** The left edge of a row with that status. */
export const edgeOf: Readonly<Record<TaskStatus, string>> = {
  upcoming: '',
  'due soon': '',
  due: 'edge-due',
  overdue: 'edge-late',
  'seriously overdue': 'edge-serious',
  deferred: '',
  suspended: '',
}
