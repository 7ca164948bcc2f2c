import { z } from 'zod'
import type { Limits } from '~/book/limits'

interface Figure {
  limits: Limits
  missing: string
  /** What to say of text that is no number. */
  wrong: string
  /** What to say of a number outside the limits. */
  outside: string | ((issue: { input?: unknown }) => string)
}

/** A number typed as text: digits with a decimal point or comma, blanks around it. Gives the number. */
export function figure({ limits: [least, most], missing, wrong, outside }: Figure) {
  return z
    .string(missing)
    .trim()
    .regex(/^[+\-−]?\d{1,9}(?:[.,]\d{0,9})?$/, wrong)
    .transform((text) => Number(text.replace(',', '.').replace('−', '-')))
    .pipe(z.number().min(least, { error: outside }).max(most, { error: outside }))
}

/** A name as people give it: not empty, at most 80 letters. */
export const nameField = (missing: string) => z.string(missing).trim().min(1, missing).max(80, 'Up to 80 letters.')
