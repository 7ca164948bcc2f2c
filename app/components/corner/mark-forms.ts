import { z } from 'zod'
import * as mini from 'zod/mini'
import { type BrakeRole, GROUNDS, MANNERS, MARK_KINDS, type MarkKind } from '~/book/kinds'
import { placeSchema } from '~/book/schemas'
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
const number = (error: string) => z.number({ error })
const metres = number(words.form.metres).min(0, words.form.metres).max(5000, words.form.metresFar)
const across = number(words.form.across).min(0, words.form.across).max(FARTHEST_ACROSS, words.form.acrossFar)
const speed = number(words.form.speed).min(0, words.form.speed).max(500, { error: words.form.speedFar }).optional()
const gear = number(words.form.gear).int(words.form.gear).min(1, words.form.gear).max(10, words.form.gear).optional()

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
