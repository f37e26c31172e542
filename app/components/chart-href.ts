import type { TaskView } from '#app/rules/views.ts'

/** The form that charts a due task, opened with what the task already says. */
export function chartHref(patientId: string, task: Pick<TaskView, 'kind' | 'name'>): string {
  return `/patients/${patientId}/chart/${task.kind}?task=${task.name}`
}
