import type { FieldMetadata } from '@conform-to/react'
import { FieldErrors, SelectField, TextField } from '~/components/form/field'
import { Button } from '~/components/ui/button'
import { Icon } from '~/components/ui/icon'
import { circuitWords as words } from '~/words/circuits'

interface StartFieldsProps {
  fields: { startMetres: FieldMetadata<string>; startWay: FieldMetadata<string>; startFrom: FieldMetadata<string> }
  corners: readonly { key: string; number: string; name: string }[]
}

/** Turns the lap round, or moves its start line by typed metres from where it is or from a corner's entry. */
export function StartFields({ fields: { startMetres, startWay, startFrom }, corners }: StartFieldsProps) {
  return (
    <div className="grid gap-3">
      <div>
        <Button name="intent" value="reverse">
          <Icon name="turn" />
          {words.reverse}
        </Button>
      </div>
      <div className="grid grid-cols-[84px_96px_minmax(0,1fr)] gap-2">
        <TextField field={startMetres} label={words.moveMetres} inputMode="decimal" className="num" ownErrors />
        <SelectField field={startWay} label={words.moveWay}>
          <option value="back">{words.back}</option>
          <option value="ahead">{words.ahead}</option>
        </SelectField>
        <SelectField field={startFrom} label={words.moveFrom}>
          <option value="">{words.fromNow}</option>
          {corners.map(({ key, number, name }) => (
            <option key={key} value={key}>
              {words.fromCorner(number, name)}
            </option>
          ))}
        </SelectField>
      </div>
      <FieldErrors id={startMetres.errorId} errors={startMetres.errors} />
      <div>
        <Button name="intent" value="start">
          <Icon name="flag" />
          {words.move}
        </Button>
      </div>
    </div>
  )
}
