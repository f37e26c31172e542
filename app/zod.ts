import { z } from 'zod'

// Without this, zod probes for `eval` in the browser, and the content security policy reports it on every page.
z.config({ jitless: true })
