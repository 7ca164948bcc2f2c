import { z } from 'zod'
import { largestFile } from '~/track/read/text'
import { importWords as words } from '~/words/import'

/** What the form that brings a circuit file in sends. */
export const uploadSchema = z.object({
  name: z.string().trim().max(80, 'Up to 80 letters.').optional(),
  file: z
    .instanceof(File, { error: words.fileMissing })
    .refine((file) => file.name !== '', { error: words.fileMissing, abort: true })
    .superRefine((file, context) => {
      if (file.size === 0) context.addIssue({ code: 'custom', message: words.fileEmpty(file.name) })
      if (file.size > largestFile) context.addIssue({ code: 'custom', message: words.fileTooLarge(file.name) })
    }),
})
