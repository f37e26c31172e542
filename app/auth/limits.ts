/** A session that nobody uses ends after this long. NIST SP 800-63B-4: inactivity at AAL2 should be at most one hour. */
export const IDLE_LIMIT_MINUTES = 60

/** A session ends this long after sign-in, whatever is done with it. NIST SP 800-63B-4 allows 24 h; one long shift needs 12. */
export const SESSION_LIMIT_HOURS = 12

/** How long before either end the page says so. */
export const WARNING_MINUTES = 2

/** How long a reason opens a patient of another ward. */
export const GRANT_MINUTES = 60

/** How long a one-time password works. */
export const ONE_TIME_PASSWORD_HOURS = 24

/** How long a draft that was kept at the end of a session waits for its author. */
export const DRAFT_HOURS = 24

/** What one draft may hold, in characters of its names and values. */
export const DRAFT_LIMIT_CHARACTERS = 64_000
