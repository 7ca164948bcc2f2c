import { z } from 'zod'
import * as mini from 'zod/mini'
import { type BrakeRole, GROUNDS, MANNERS, MARK_KINDS, type MarkKind } from '~/book/kinds'
import type { Limits } from '~/book/limits'
import { placeSchema } from '~/book/schemas'
import { figure } from '~/components/form/figure'
import { corner as words } from '~/words/corner'
import { FARTHEST_ACROSS } from './typed-place'

/** The forms of the corner page: what the browser sends, with or without JavaScript. */

/** A mark's kind with a brake's role, as one choice. */
export const MARK_CHOICES = MARK_KINDS.flatMap((kind) =>
  kind === 'brake' ? (['brake-start', 'brake-target'] as const) : [kind as Exclude<MarkKind, 'brake'>],
)
export type MarkChoice = (typeof MARK_CHOICES)[number]

/** The kind and role behind a choice. */
export function kindOfChoice(choice: MarkChoice): { kind: MarkKind; role: BrakeRole | null } {
  if (choice === 'brake-start') return { kind: 'brake', role: 'start' }
  if (choice === 'brake-target') return { kind: 'brake', role: 'target' }
  return { kind: choice, role: null }
}

const id = z.uuid()
const measured = (limits: Limits, wrong: string, outside: Parameters<typeof figure>[0]['outside']) =>
  figure({ limits, missing: wrong, wrong, outside })
const metres = measured([0, 5000], words.form.metres, words.form.metresFar)
const across = measured([0, FARTHEST_ACROSS], words.form.across, words.form.acrossFar)
const speed = measured([0, 500], words.form.speed, words.form.speedFar).optional()
const gear = measured([1, 10], words.form.gear, words.form.gear).pipe(z.number().int(words.form.gear)).optional()

const where = {
  ground: z.enum(GROUNDS),
  metres,
  side: z.enum(['before', 'after']),
  across: across.default(0),
  hand: z.enum(['left', 'right']),
  manner: z.enum(MANNERS).optional(),
  gear,
  speed,
}

/** Plain data that travels with a form as text. */
const carried = z.string().transform((text, context) => {
  try {
    return JSON.parse(text) as unknown
  } catch {
    context.addIssue({ code: 'custom', message: words.form.stale })
    return z.NEVER
  }
})

/** What the form's maker saw, so that a change meanwhile by another shows. */
const seen = carried.pipe(
  mini.strictObject({
    place: mini.nullable(placeSchema),
    manner: mini.nullable(mini.enum(MANNERS)),
    gear: mini.nullable(mini.number()),
    speed: mini.nullable(mini.number()),
  }),
)

/** The place as its fields showed it: what comes back unchanged was not moved. */
const shown = carried.pipe(
  mini.strictObject({ metres: mini.string(), side: mini.string(), across: mini.string(), hand: mini.string() }),
)

export const addForm = z.object({
  intent: z.literal('add'),
  operation: id,
  mark: id,
  kind: z.enum(MARK_CHOICES, { error: words.form.kind }),
  condition: id,
  whose: z.enum(['everyone', 'me']),
  ...where,
})
export const changeForm = z.object({
  intent: z.literal('change'),
  operation: id,
  mark: id,
  seen,
  shown: shown.optional(),
  ...where,
})

export const cornerForm = z.discriminatedUnion('intent', [
  addForm,
  changeForm,
  z.object({ intent: z.literal('clear'), operation: id, mark: id, ground: z.enum(GROUNDS), seen }),
  z.object({ intent: z.literal('drop'), operation: id, mark: id }),
  z.object({ intent: z.literal('undo'), change: id }),
  z.object({ intent: z.literal('decide'), proposal: id, verdict: z.enum(['accept', 'decline']) }),
])
export type CornerIntent = z.output<typeof cornerForm>
