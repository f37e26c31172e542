/** The task that observations are due by; what runs under observation names it. */
export const observationTaskName = 'observations'
