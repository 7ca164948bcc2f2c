import { type FieldMetadata, getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { getZodConstraint, parseWithZod } from '@conform-to/zod/v4'
import { Form, Link } from 'react-router'
import { GROUNDS, type Ground, MANNERS } from '~/book/kinds'
import type { MarkView } from '~/book/view'
import { SelectField, TextField } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { acrossWords, corner as words } from '~/words/corner'
import { cornerLabels as labels } from '~/words/corner-labels'
import { groundWord, mannerWord, markKind } from '~/words/kinds'
import { addForm, changeForm, kindOfChoice, MARK_CHOICES } from './mark-forms'
import { markName } from './mark-words'
import type { CornerPageData } from './page-data'
import { kmhField, placeFromTyped, seenOf, type TypedPlace, typedFrom } from './typed-place'

interface FormProps {
  page: CornerPageData
  /** Address of the page with no form open. */
  closeTo: string
  lastResult: SubmissionResult<string[]> | null
}

/** Adds a mark: what happens, where. The place comes from a tap on the map or is typed. */
export function AddMarkForm({ page, closeTo, lastResult, tapped }: FormProps & { tapped: TypedPlace | null }) {
  const [form, fields] = useForm({
    id: 'add-mark',
    lastResult,
    defaultValue: {
      ground: page.show === 'both' ? 'real' : page.show,
      whose: 'everyone',
      ...(tapped ?? { side: 'before', hand: 'left' }),
    },
    constraint: getZodConstraint(addForm),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: addForm }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="mark-form" preventScrollReset>
      <h2 className="h3">{labels.addTitle}</h2>
      <Hidden intent="add" operation={page.ids.operation} mark={page.ids.mark} condition={page.condition} />
      <FormErrors form={form} />
      <div className="mark-fields">
        <SelectField field={fields.kind} label={labels.what}>
          <option value="">{labels.choose}</option>
          {MARK_CHOICES.map((choice) => {
            const { kind, role } = kindOfChoice(choice)
            return (
              <option key={choice} value={choice}>
                {markKind(kind, role)}
              </option>
            )
          })}
        </SelectField>
        <GroundField field={fields.ground} />
        <PlaceFields {...{ page, fields }} />
        <DetailFields fields={fields} />
        <SelectField field={fields.whose} label={labels.whose}>
          <option value="everyone">{labels.everyones}</option>
          <option value="me">{labels.mine}</option>
        </SelectField>
      </div>
      <Buttons closeTo={closeTo} label={labels.add} />
    </Form>
  )
}

/** Changes a mark's place and what goes with it, takes the place away, or takes the mark off the book. */
export function ChangeMarkForm({
  page,
  closeTo,
  lastResult,
  mark,
  ground,
  mayDrop,
}: FormProps & { mark: MarkView; ground: Ground; mayDrop: boolean }) {
  const place = mark[ground]
  const shown = place ? typedFrom(place) : null
  const details = { manner: mark.manner ?? '', gear: mark.gear?.toString() ?? '', speed: kmhField(mark.speed) }
  const [form, fields] = useForm({
    id: `change-${mark.id}-${ground}`,
    lastResult,
    defaultValue: { ...(shown ?? { side: 'before', hand: 'left' }), ...details },
    constraint: getZodConstraint(changeForm),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: changeForm }),
    shouldRevalidate: 'onInput',
  })
  const named = { operation: page.ids.operation, mark: mark.id }
  const seen = JSON.stringify(seenOf(mark, ground))
  return (
    <div className="mark-form">
      <Form method="post" {...getFormProps(form)} preventScrollReset>
        <h2 className="h3">
          {markName(mark)} <span className="muted">{groundWord(ground).toLowerCase()}</span>
        </h2>
        <Hidden intent="change" {...named} ground={ground} seen={seen} />
        {shown ? <Hidden shown={JSON.stringify(shown)} /> : <Hidden {...details} />}
        <FormErrors form={form} />
        <div className="mark-fields">
          <PlaceFields {...{ page, fields }} />
          {shown ? <DetailFields fields={fields} /> : null}
        </div>
        <Buttons closeTo={closeTo} label={place ? words.save : words.givePlace(ground)} />
      </Form>
      <div className="drop-forms">
        {mark.sim && mark.real ? (
          <Form method="post" preventScrollReset>
            <Hidden intent="clear" {...named} ground={ground} seen={seen} />
            <Button look="quiet" size="small">
              {words.clear}
            </Button>
          </Form>
        ) : null}
        {mayDrop ? (
          <Form method="post" preventScrollReset>
            <Hidden intent="drop" {...named} />
            <Button look="danger" size="small">
              {words.drop}
            </Button>
          </Form>
        ) : null}
      </div>
    </div>
  )
}

/** Named values that travel with a form. */
export function Hidden(values: Record<string, string>) {
  return Object.entries(values).map(([name, value]) => <input key={name} type="hidden" name={name} value={value} />)
}

function Buttons({ closeTo, label }: { closeTo: string; label: string }) {
  return (
    <p className="mark-buttons">
      <Button look="primary">{label}</Button>
      <Link className="btn btn-quiet" to={closeTo} preventScrollReset>
        {labels.cancel}
      </Link>
    </p>
  )
}

type Fields<Name extends string> = Record<Name, FieldMetadata<unknown>>

function GroundField({ field }: { field: FieldMetadata<unknown> }) {
  return (
    <SelectField field={field} label={labels.where}>
      {GROUNDS.map((ground) => (
        <option key={ground} value={ground}>
          {groundWord(ground)}
        </option>
      ))}
    </SelectField>
  )
}

function PlaceFields({ page, fields }: { page: CornerPageData; fields: Fields<keyof TypedPlace> }) {
  const { corner, layout, car } = page.cut
  const value = (name: keyof TypedPlace) => fields[name].value as string | undefined
  const typed = placeFromTyped({
    metres: value('metres'),
    side: value('side'),
    across: value('across'),
    hand: value('hand'),
  })
  return (
    <>
      <TextField
        field={fields.metres}
        label={labels.toDatum}
        inputMode="decimal"
        hint={words.zero(corner.datum.words)}
      />
      <SelectField field={fields.side} label={labels.side}>
        <option value="before">{labels.sides.before}</option>
        <option value="after">{labels.sides.after}</option>
      </SelectField>
      <TextField
        field={fields.across}
        label={labels.across}
        inputMode="decimal"
        hint={typed ? acrossWords(typed.offset, layout.roadWidth, car.width) : labels.acrossHint}
      />
      <SelectField field={fields.hand} label={labels.hand}>
        <option value="left">{labels.hands.left}</option>
        <option value="right">{labels.hands.right}</option>
      </SelectField>
    </>
  )
}

function DetailFields({ fields }: { fields: Fields<'manner' | 'gear' | 'speed'> }) {
  return (
    <>
      <TextField field={fields.speed} label={labels.speed} inputMode="decimal" />
      <TextField field={fields.gear} label={labels.gear} inputMode="numeric" />
      <SelectField field={fields.manner} label={labels.manner}>
        <option value="">{labels.notSaid}</option>
        {MANNERS.map((manner) => (
          <option key={manner} value={manner}>
            {mannerWord(manner)}
          </option>
        ))}
      </SelectField>
    </>
  )
}
