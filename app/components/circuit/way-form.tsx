import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { Form } from 'react-router'
import { FormErrors } from '~/components/form/form-errors'
import { circuitWords as words } from '~/words/circuits'
import type { LayoutCorner, LayoutPageData } from './layout-data'
import { StartFields } from './start-fields'

interface WayFormProps {
  layout: LayoutPageData['layout']
  corners: readonly LayoutCorner[]
  lastResult: SubmissionResult<string[]> | null
}

/** Turns a layout round or moves its start line. Sends what the page showed of both. */
export function WayForm({ layout, corners, lastResult }: WayFormProps) {
  const [form, fields] = useForm<{ startMetres: string; startWay: string; startFrom: string }>({
    id: 'way',
    lastResult,
    defaultValue: { startMetres: '', startWay: 'back', startFrom: '' },
  })
  const named = corners.map(({ id, number, name }) => ({ key: id, number, name }))
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)}>
      <button type="submit" name="intent" value="start" className="hidden" tabIndex={-1} aria-hidden="true" />
      <input type="hidden" name="seenStart" value={layout.startAlong} />
      <input type="hidden" name="seenReversed" value={String(layout.reversed)} />
      <FormErrors form={form} />
      <StartFields fields={fields} corners={named} />
      <p className="sm muted mt-2">{words.booksCount}</p>
    </Form>
  )
}
