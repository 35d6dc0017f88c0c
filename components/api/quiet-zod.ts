import { z } from 'zod'

// zod compiles checkers with new Function where it may; the pages' content security policy forbids that, and the attempt would be reported.
z.config({ jitless: true })
