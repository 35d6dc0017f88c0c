import { z } from 'zod'
import { Name } from './scalars'

export const LEAST_PASSWORD_LENGTH = 12
export const MOST_PASSWORD_LENGTH = 200

export const Password = z
  .string()
  .min(LEAST_PASSWORD_LENGTH, `at least ${LEAST_PASSWORD_LENGTH} characters`)
  .max(MOST_PASSWORD_LENGTH, `at most ${MOST_PASSWORD_LENGTH} characters`)

/** What the first visit to an empty installation asks for. */
export const SetupForm = z.strictObject({
  code: z.string().trim().min(1, 'the code is in the log of the service').max(100),
  teamName: Name,
  name: Name,
  email: z.email('an e-mail address such as ines@tarnholm.example').max(254),
  password: Password,
})
export type SetupForm = z.infer<typeof SetupForm>
