import { z } from 'zod'
import { bookWords as words } from '~/words/books'

/** What the form that makes a book sends. */
export const bookSchema = z.object({
  id: z.uuid(),
  layout: z.uuid(words.layoutMissing),
  car: z.uuid(words.carMissing),
  name: z.string().trim().max(80, 'Up to 80 letters.').optional(),
})
