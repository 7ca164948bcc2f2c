import { z } from 'zod'
import { signInWords as words } from '~/words/sign-in'

/** What the sign-in form sends. `next` is where to go afterwards. */
export const signInSchema = z.object({
  email: z
    .string(words.emailMissing)
    .trim()
    .max(254, words.emailWrong)
    .regex(/^[^\s@]+@[^\s@]+$/, words.emailWrong),
  password: z.string(words.passwordMissing).max(1000, words.passwordMissing),
  next: z.string().optional(),
})
