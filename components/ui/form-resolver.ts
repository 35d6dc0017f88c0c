import { zodResolver } from '@hookform/resolvers/zod'
import { z } from 'zod'

// In the browser zod would try to compile its parsers, which the content security policy refuses and reports.
z.config({ jitless: true })

/** Checks a form with the schema that the service checks it with. */
export const formResolver = zodResolver
