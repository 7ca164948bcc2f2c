import type { FieldMetadata } from '@conform-to/react'
import { SelectField, TextField } from '~/components/form/field'
import { importWords as words } from '~/words/import'

interface CircuitFieldsProps {
  fields: {
    name: FieldMetadata<string>
    layout: FieldMetadata<string>
    timeZone: FieldMetadata<string>
    roadWidth: FieldMetadata<string>
  }
  /** IANA time zones. */
  zones: readonly string[]
}

const areaOf = (zone: string) => (zone.includes('/') ? zone.slice(0, zone.indexOf('/')) : '')
const placeOf = (zone: string) => zone.slice(zone.indexOf('/') + 1).replaceAll('_', ' ')

/** What a circuit is called, where its clock is and how wide its road. */
export function CircuitFields({ fields, zones }: CircuitFieldsProps) {
  const areas = [...new Set(zones.map(areaOf))]
  return (
    <div className="grid gap-3">
      <TextField field={fields.name} label={words.circuitName} autoComplete="off" />
      <TextField field={fields.layout} label={words.layoutName} hint={words.layoutHint} autoComplete="off" />
      <SelectField field={fields.timeZone} label={words.timeZone}>
        <option value="">{words.timeZoneChoose}</option>
        {areas.map((area) => (
          <optgroup key={area} label={area || words.timeZone}>
            {zones
              .filter((zone) => areaOf(zone) === area)
              .map((zone) => (
                <option key={zone} value={zone}>
                  {placeOf(zone)}
                </option>
              ))}
          </optgroup>
        ))}
      </SelectField>
      <TextField
        field={fields.roadWidth}
        label={words.roadWidth}
        hint={words.roadWidthHint}
        inputMode="decimal"
        className="num max-w-40"
      />
    </div>
  )
}
