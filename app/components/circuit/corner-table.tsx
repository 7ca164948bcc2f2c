import { type FieldMetadata, getFormProps, getInputProps, type SubmissionResult, useForm } from '@conform-to/react'
import { Form } from 'react-router'
import { FieldErrors } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { NumberPlate } from '~/components/ui/plate'
import { circuitWords as words } from '~/words/circuits'
import { formatDegrees, formatNumber, formatRadius } from '~/words/measures'
import { turnLetter } from '~/words/overview'
import { type CornerFields, cornerFields, type LayoutCorner } from './layout-data'

interface CornerTableProps {
  corners: readonly LayoutCorner[]
  lastResult: SubmissionResult<string[]> | null
  mayChange: boolean
}

/** The corners in driving order; who may changes their numbers and names in place. */
export function CornerTable({ corners, lastResult, mayChange }: CornerTableProps) {
  if (!mayChange) return <ReadTable corners={corners} />
  return <CornerForm corners={corners} lastResult={lastResult} />
}

function Head() {
  const { columns } = words
  return (
    <thead>
      <tr>
        <th scope="col">{columns.number}</th>
        <th scope="col">{columns.name}</th>
        <th scope="col" className="max-[420px]:hidden">
          {columns.turn}
        </th>
        <th scope="col" className="r">
          {columns.radius}
        </th>
        <th scope="col" className="r max-[799px]:hidden">
          {columns.apex}
        </th>
      </tr>
    </thead>
  )
}

function Figures({ corner }: { corner: LayoutCorner }) {
  const turn = turnLetter(corner.direction)
  return (
    <>
      <td className="num w-14 whitespace-nowrap max-[420px]:hidden">
        <abbr title={turn.word} className="no-underline">
          {turn.letter}
        </abbr>{' '}
        {formatDegrees(corner.turnDegrees)}
      </td>
      <td className="num r w-14 whitespace-nowrap">{formatRadius(corner.leastRadius)}</td>
      <td className="num r w-20 whitespace-nowrap max-[799px]:hidden">{formatNumber(corner.apex)}</td>
    </>
  )
}

function ReadTable({ corners }: { corners: readonly LayoutCorner[] }) {
  return (
    <table className="ruled">
      <caption className="sr-only">{words.corners}</caption>
      <Head />
      <tbody>
        {corners.map((corner) => (
          <tr key={corner.id}>
            <td className="w-12">
              <NumberPlate number={corner.number} />
            </td>
            <th scope="row" className="wrap-anywhere">
              {corner.name}
            </th>
            <Figures corner={corner} />
          </tr>
        ))}
      </tbody>
    </table>
  )
}

function CornerForm({ corners, lastResult }: Omit<CornerTableProps, 'mayChange'>) {
  const [form, fields] = useForm<{ corners: CornerFields[] }>({
    id: 'corners',
    lastResult,
    defaultValue: { corners: cornerFields(corners) },
  })
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)}>
      <button type="submit" name="intent" value="corners" className="hidden" tabIndex={-1} aria-hidden="true" />
      <FormErrors form={form} />
      <table className="ruled">
        <caption className="sr-only">{words.cornersCaption}</caption>
        <Head />
        <tbody>
          {fields.corners.getFieldList().map((row, i) => {
            const corner = corners[i]
            return corner ? <EditRow key={corner.id} row={row} corner={corner} /> : null
          })}
        </tbody>
      </table>
      <Button className="mt-3" name="intent" value="corners">
        {words.save}
      </Button>
    </Form>
  )
}

function Hidden({ field }: { field: FieldMetadata<string> }) {
  const { key, ...input } = getInputProps(field, { type: 'hidden' })
  return <input key={key} {...input} />
}

function EditRow({ row, corner }: { row: FieldMetadata<CornerFields>; corner: LayoutCorner }) {
  const { id, number, name, seenNumber, seenName } = row.getFieldset()
  const { key: numberKey, ...numberProps } = getInputProps(number, { type: 'text' })
  const { key: nameKey, ...nameProps } = getInputProps(name, { type: 'text' })
  return (
    <>
      <tr>
        <td className="w-16">
          <Hidden field={id} />
          <Hidden field={seenNumber} />
          <Hidden field={seenName} />
          <input
            key={numberKey}
            {...numberProps}
            className="input num mt-0"
            aria-label={words.numberOf(corner.name)}
            autoComplete="off"
          />
        </td>
        <td>
          <input
            key={nameKey}
            {...nameProps}
            className="input mt-0"
            aria-label={words.nameOf(corner.number)}
            autoComplete="off"
          />
        </td>
        <Figures corner={corner} />
      </tr>
      {(number.errors || name.errors) && (
        <tr>
          <td colSpan={5} className="pb-1.5">
            <FieldErrors id={number.errorId} errors={number.errors} />
            <FieldErrors id={name.errorId} errors={name.errors} />
          </td>
        </tr>
      )}
    </>
  )
}
