import type { FieldMetadata } from '@conform-to/react'
import { FieldErrors, TextField } from '~/components/form/field'
import { Button } from '~/components/ui/button'
import { Icon } from '~/components/ui/icon'
import type { Lap, Piece } from '~/track/read-layout'
import { importWords as words } from '~/words/import'
import { formatMetres } from '~/words/measures'

interface Choice {
  name: string
  value: number
  label: string
  figures: string
  chosen: boolean
}

/** One line of a list to choose from: a radio or a check box over its whole width. */
function ChoiceLine({ type, choice }: { type: 'radio' | 'checkbox'; choice: Choice }) {
  return (
    <li className="border-b border-rule">
      <label className="check min-h-9 justify-between">
        <span className="flex items-center gap-2">
          <input type={type} name={choice.name} value={choice.value} defaultChecked={choice.chosen} />
          {choice.label}
        </span>
        <span className="num">{choice.figures}</span>
      </label>
    </li>
  )
}

/** The line that opens a list of choices. */
function Opener({ children }: { children: string }) {
  return (
    <summary className="flex min-h-11 cursor-pointer items-center gap-1.5 [&::-webkit-details-marker]:hidden">
      <Icon name="down" />
      {children}
    </summary>
  )
}

/** The laps of a trace, to take another than the one taken. */
export function LapChoice({
  field,
  laps,
  taken,
}: {
  field: FieldMetadata<string>
  laps: readonly Lap[]
  taken: number
}) {
  return (
    <details open={field.errors !== undefined}>
      <Opener>{words.laps(taken, laps.length)}</Opener>
      <ul className="max-h-80 overflow-y-auto border-t border-rule">
        {laps.map((lap) => (
          <ChoiceLine
            key={lap.index}
            type="radio"
            choice={{
              name: field.name,
              value: lap.index,
              label: words.lap(lap.index),
              figures: words.lapFigures(lap.lengthMetres, lap.seconds, lap.gapSeconds),
              chosen: lap.index === taken,
            }}
          />
        ))}
      </ul>
      <FieldErrors id={field.errorId} errors={field.errors} />
      <Button className="mt-2" name="intent" value="lap">
        {words.takeLap}
      </Button>
    </details>
  )
}

/** The pieces of a drawing, to join others than those joined. */
export function PieceChoice({ field, pieces }: { field: FieldMetadata<string[]>; pieces: readonly Piece[] }) {
  const used = pieces.filter((piece) => piece.used).length
  return (
    <details open={field.errors !== undefined}>
      <Opener>{words.pieces(used, pieces.length)}</Opener>
      <ul className="max-h-80 overflow-y-auto border-t border-rule">
        {pieces.map((piece) => (
          <ChoiceLine
            key={piece.index}
            type="checkbox"
            choice={{
              name: field.name,
              value: piece.index,
              label: words.piece(piece.index, piece.name),
              figures: formatMetres(piece.lengthMetres),
              chosen: piece.used,
            }}
          />
        ))}
      </ul>
      <FieldErrors id={field.errorId} errors={field.errors} />
      <Button className="mt-2" name="intent" value="pieces">
        {words.takePieces}
      </Button>
    </details>
  )
}

interface AnchorFieldsProps {
  fields: { longitude: FieldMetadata<string>; latitude: FieldMetadata<string> }
}

/** Where a file in metres lies on the globe, to be put elsewhere. */
export function AnchorChoice({ fields }: AnchorFieldsProps) {
  return (
    <details open={Boolean(fields.longitude.errors ?? fields.latitude.errors)}>
      <Opener>{words.anchorAgain}</Opener>
      <AnchorFields fields={fields} />
    </details>
  )
}

/** Where a file in metres lies on the globe. */
export function AnchorFields({ fields: { longitude, latitude } }: AnchorFieldsProps) {
  return (
    <div className="grid max-w-md gap-3">
      <p className="sr-only">{words.anchor}</p>
      <div className="grid grid-cols-2 gap-2.5">
        <TextField field={longitude} label={words.longitude} className="num" autoComplete="off" />
        <TextField field={latitude} label={words.latitude} className="num" autoComplete="off" />
      </div>
      <p className="field-hint">{words.anchorHint}</p>
      <div>
        <Button name="intent" value="anchor">
          {words.giveAnchor}
        </Button>
      </div>
    </div>
  )
}
