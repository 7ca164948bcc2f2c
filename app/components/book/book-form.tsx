import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { getZodConstraint, parseWithZod } from '@conform-to/zod/v4'
import { Form, Link } from 'react-router'
import type { z } from 'zod'
import { SelectField, TextField } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import type { Metres } from '~/track/units'
import { bookWords as words } from '~/words/books'
import { bookSchema } from './schema'

interface BookFormProps {
  newId: string
  layouts: readonly { id: string; circuit: string; name: string; length: Metres }[]
  cars: readonly { id: string; name: string }[]
  /** What is chosen to begin with. */
  chosen: { layout: string; car: string }
  lastResult: SubmissionResult<string[]> | null | undefined
  listPath: string
}

/** Makes a book for a layout and a car. */
export function BookForm({ newId, layouts, cars, chosen, lastResult, listPath }: BookFormProps) {
  const [form, fields] = useForm<z.input<typeof bookSchema>, z.output<typeof bookSchema>>({
    id: 'book',
    lastResult,
    constraint: getZodConstraint(bookSchema),
    defaultValue: chosen,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: bookSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-4">
      <FormErrors form={form} />
      <input type="hidden" name={fields.id.name} defaultValue={fields.id.initialValue ?? newId} />
      <SelectField field={fields.layout} label={words.layout}>
        <option value="">{words.layoutChoose}</option>
        {layouts.map(({ id, circuit, name, length }) => (
          <option key={id} value={id}>
            {words.layoutLine(circuit, name, length)}
          </option>
        ))}
      </SelectField>
      <SelectField field={fields.car} label={words.car} hint={words.carHint}>
        <option value="">{words.carChoose}</option>
        {cars.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </SelectField>
      <TextField field={fields.name} label={words.name} hint={words.nameHint} autoComplete="off" />
      <div className="flex flex-wrap gap-2.5">
        <Button look="primary">{words.button}</Button>
        <Link className="btn btn-quiet" to={listPath}>
          {words.cancel}
        </Link>
      </div>
    </Form>
  )
}
