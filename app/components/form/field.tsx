import type { FieldMetadata } from '@conform-to/react'
import { getInputProps, getSelectProps } from '@conform-to/react'
import type { InputHTMLAttributes, ReactNode } from 'react'

/** What every field of a form shows: its label, a hint, and under it what does not fit. */
interface Labelled {
  field: FieldMetadata<unknown>
  label: string
  hint?: string
  /** The form shows this field's errors in a place of their own. */
  ownErrors?: boolean
}

function Frame({ field, label, hint, ownErrors, children }: Labelled & { children: ReactNode }) {
  return (
    <div>
      <label className="field" htmlFor={field.id}>
        {label}
      </label>
      {children}
      {hint && (
        <span id={field.descriptionId} className="field-hint">
          {hint}
        </span>
      )}
      {!ownErrors && <FieldErrors id={field.errorId} errors={field.errors} />}
    </div>
  )
}

/** What does not fit in a field, one line each; nothing where all fits. */
export function FieldErrors({ id, errors }: { id: string; errors: string[] | undefined }) {
  if (!errors?.length) return null
  return (
    <span id={id} className="field-error">
      {errors.join(' ')}
    </span>
  )
}

type Typed = Pick<InputHTMLAttributes<HTMLInputElement>, 'autoComplete' | 'inputMode' | 'list' | 'placeholder'>

/** One line of text, or a figure typed as text so that what was typed comes back as it was. */
export function TextField({
  field,
  label,
  hint,
  type = 'text',
  className = '',
  ownErrors,
  ...rest
}: Labelled & Typed & { type?: 'text' | 'email' | 'password'; className?: string }) {
  const { key, ...input } = getInputProps(field, { type, ariaDescribedBy: hint ? field.descriptionId : undefined })
  return (
    <Frame field={field} label={label} hint={hint} ownErrors={ownErrors}>
      <input key={key} {...input} className={`input ${className}`} {...rest} />
    </Frame>
  )
}

/** One of a list. */
export function SelectField({ field, label, hint, children }: Labelled & { children: ReactNode }) {
  const { key, ...select } = getSelectProps(field, { ariaDescribedBy: hint ? field.descriptionId : undefined })
  return (
    <Frame field={field} label={label} hint={hint}>
      <select key={key} {...select} className="input">
        {children}
      </select>
    </Frame>
  )
}

const FILE =
  'input p-0 file:mr-3 file:min-h-[34px] file:cursor-pointer file:border-0 file:border-r file:border-solid file:border-ink ' +
  'file:bg-transparent file:px-3.5 file:font-semibold max-[799px]:file:min-h-[46px]'

/** A file to choose. */
export function FileField({ field, label, hint, accept }: Labelled & { accept: string }) {
  const { key, ...input } = getInputProps(field, {
    type: 'file',
    value: false,
    ariaDescribedBy: hint ? field.descriptionId : undefined,
  })
  return (
    <Frame field={field} label={label} hint={hint}>
      <input key={key} {...input} accept={accept} className={FILE} />
    </Frame>
  )
}
