import * as z from 'zod/mini'
import { FINDING_METHODS, FINDING_VERDICTS, GROUNDS, PROOFS } from './kinds'
import { lengthSchema } from './schemas'

/** What someone found of one place of a mark, as it is sent. Findings are only ever added. */

const ACCURACY_LIMIT = 10_000

export const findingSchema = z.strictObject({
  id: z.uuid(),
  mark: z.uuid(),
  ground: z.enum(GROUNDS),
  /** Whose proof it is; who sends it is who found it. */
  person: z.uuid(),
  condition: z.uuid(),
  verdict: z.enum(FINDING_VERDICTS),
  proof: z.enum(PROOFS),
  method: z.enum(FINDING_METHODS),
  accuracy: z.nullable(z.number().check(z.gte(0), z.lte(ACCURACY_LIMIT))),
  /** Where it was found: metres of the drawn line. */
  along: lengthSchema,
  across: lengthSchema,
  foundAt: z.iso.datetime({ offset: true }),
  note: z.string().check(z.maxLength(2000)),
})

export type FindingEntry = z.output<typeof findingSchema>
