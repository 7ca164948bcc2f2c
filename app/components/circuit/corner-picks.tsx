import { type FieldMetadata, getInputProps } from '@conform-to/react'
import { FieldErrors } from '~/components/form/field'
import type { DraftCorner } from '~/track/layout-draft'
import { circuitWords } from '~/words/circuits'
import { importWords as words } from '~/words/import'
import { formatDegrees, formatRadius } from '~/words/measures'
import { turnLetter } from '~/words/overview'

interface Row {
  key: string
  accept: boolean
  number: string
  name: string
}

interface CornerPicksProps {
  field: FieldMetadata<Row[]>
  corners: readonly DraftCorner[]
}

/** The proposed corners: which to keep, their numbers and names. */
export function CornerPicks({ field, corners }: CornerPicksProps) {
  const { columns } = circuitWords
  return (
    <>
      <table className="ruled">
        <thead>
          <tr>
            <th scope="col">{columns.keep}</th>
            <th scope="col">{columns.number}</th>
            <th scope="col">{columns.name}</th>
            <th scope="col" className="max-[420px]:hidden">
              {columns.turn}
            </th>
            <th scope="col" className="r">
              {columns.radius}
            </th>
          </tr>
        </thead>
        <tbody>
          {field.getFieldList().map((row, i) => {
            const corner = corners[i]
            return corner ? <PickRow key={row.key} row={row} corner={corner} /> : null
          })}
        </tbody>
      </table>
      <FieldErrors id={field.errorId} errors={field.errors} />
    </>
  )
}

function PickRow({ row, corner }: { row: FieldMetadata<Row>; corner: DraftCorner }) {
  const { key, accept, number, name } = row.getFieldset()
  const { key: acceptKey, ...acceptProps } = getInputProps(accept, { type: 'checkbox' })
  const { key: numberKey, ...numberProps } = getInputProps(number, { type: 'text' })
  const { key: nameKey, ...nameProps } = getInputProps(name, { type: 'text' })
  const turn = turnLetter(corner.direction)
  return (
    <>
      <tr>
        <td className="w-10">
          <input type="hidden" name={key.name} value={corner.key} />
          <label className="check justify-center">
            <input key={acceptKey} {...acceptProps} aria-label={circuitWords.keepOf(corner.number)} />
          </label>
        </td>
        <td className="w-16">
          <input
            key={numberKey}
            {...numberProps}
            className="input num mt-0"
            aria-label={circuitWords.numberOf(words.turnName(corner.number))}
            autoComplete="off"
          />
        </td>
        <td>
          <input
            key={nameKey}
            {...nameProps}
            className="input mt-0 placeholder:text-ink-muted placeholder:italic"
            placeholder={words.turnName(corner.number)}
            aria-label={circuitWords.nameOf(corner.number)}
            autoComplete="off"
          />
        </td>
        <td className="num w-14 whitespace-nowrap max-[420px]:hidden">
          <abbr title={turn.word} className="no-underline">
            {turn.letter}
          </abbr>{' '}
          {formatDegrees(corner.turnDegrees)}
        </td>
        <td className="num r w-14 whitespace-nowrap">{formatRadius(corner.leastRadius)}</td>
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
