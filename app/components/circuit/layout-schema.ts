import { z } from 'zod'
import { figure, nameField } from '~/components/form/figure'
import type { Metres } from '~/track/units'
import { circuitWords as words } from '~/words/circuits'

/** What the page of a layout sends. Beside each value goes what the page showed, so that nobody's change is written over unseen. */
const row = z.object({
  id: z.uuid(),
  number: z
    .string(words.numberWrong)
    .trim()
    .regex(/^[0-9]{1,2}[A-Z]?$/, words.numberWrong),
  name: nameField(words.nameMissing),
  seenNumber: z.string(),
  seenName: z.string(),
})

/** No number twice. */
function checkNumbers(rows: readonly { number: string }[], context: z.RefinementCtx) {
  for (const [at, { number }] of rows.entries()) {
    const first = rows.findIndex((other) => other.number === number)
    if (first < at) context.addIssue({ code: 'custom', path: [at, 'number'], message: words.numberTwice(number) })
  }
}

export const cornersSchema = z.object({
  /** The corner whose change by another stands. */
  skip: z.uuid().optional(),
  corners: z.array(row).default([]).superRefine(checkNumbers),
})

const seen = {
  seenStart: z.coerce.number(),
  seenReversed: z.enum(['true', 'false']).transform((text) => text === 'true'),
}

export const reverseSchema = z.object(seen)
export const startSchema = (length: Metres) =>
  z.object({
    ...seen,
    startMetres: figure({
      limits: [0, length],
      missing: words.metresMissing,
      wrong: words.metresWrong,
      outside: words.metresOutside(length),
    }),
    startWay: z.enum(['ahead', 'back']),
    startFrom: z.string().optional(),
  })

/** The start line at a place of the drawn line, in metres along it. */
export const startAtSchema = z.object({ seenStart: seen.seenStart, startAlong: z.coerce.number().min(0) })

export const undoSchema = z.object({ operation: z.uuid().optional(), batch: z.uuid().optional() })
