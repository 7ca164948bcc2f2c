import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { getZodConstraint, parseWithZod } from '@conform-to/zod/v4'
import { Form, Link } from 'react-router'
import type { z } from 'zod'
import { TextField } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { carWords as words } from '~/words/cars'
import { carSchema } from './schema'

interface CarFormProps {
  /** Id for a new car. */
  newId: string
  /** The car to change, as it is now; none for a new one. */
  car: { id: string; name: string; length: number; width: number; eyeHeight: number } | null
  lastResult: SubmissionResult<string[]> | null | undefined
  /** Where to go without changing anything. */
  listPath: string
}

const typedOf = (car: NonNullable<CarFormProps['car']>) => ({
  ...car,
  length: `${car.length}`,
  width: `${car.width}`,
  eyeHeight: `${car.eyeHeight}`,
})

/** Adds a car, or changes one. */
export function CarForm({ newId, car, lastResult, listPath }: CarFormProps) {
  const [form, fields] = useForm<z.input<typeof carSchema>, z.output<typeof carSchema>>({
    id: `car-${car?.id ?? 'new'}`,
    lastResult,
    constraint: getZodConstraint(carSchema),
    defaultValue: car ? typedOf(car) : undefined,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: carSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-3">
      <h2 className="h2">{car ? words.change(car.name) : words.add}</h2>
      <FormErrors form={form} />
      <input type="hidden" name={fields.id.name} defaultValue={car?.id ?? fields.id.initialValue ?? newId} />
      <TextField field={fields.name} label={words.name} hint={words.nameHint} autoComplete="off" />
      <div className="grid grid-cols-2 gap-2.5">
        <TextField field={fields.length} label={words.length} inputMode="decimal" className="num" />
        <TextField field={fields.width} label={words.width} inputMode="decimal" className="num" />
      </div>
      <TextField
        field={fields.eyeHeight}
        label={words.eye}
        hint={words.eyeHint}
        inputMode="decimal"
        className="num max-w-40"
      />
      {car && <p className="sm muted">{words.pinned}</p>}
      <div className="flex flex-wrap gap-2.5">
        <Button look="primary">{car ? words.changeButton : words.addButton}</Button>
        {car && (
          <Link className="btn btn-quiet" to={listPath}>
            {words.cancel}
          </Link>
        )}
      </div>
    </Form>
  )
}
