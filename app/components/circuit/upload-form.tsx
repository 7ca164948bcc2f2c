import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { Form, Link, useNavigation } from 'react-router'
import { FileField, TextField } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { importWords as words } from '~/words/import'
import { uploadSchema } from './upload-schema'

interface UploadFormProps {
  lastResult: SubmissionResult<string[]> | null | undefined
  listPath: string
}

const TYPES = '.geojson,.json,.gpx,.kml,.csv,.txt,application/geo+json,application/gpx+xml,text/csv'

/** The file of a circuit, and the name it is to have. */
export function UploadForm({ lastResult, listPath }: UploadFormProps) {
  const [form, fields] = useForm({
    id: 'upload',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: uploadSchema }),
    shouldRevalidate: 'onInput',
  })
  const reading = useNavigation().state === 'submitting'
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="grid gap-4">
      <FormErrors form={form} />
      <TextField field={fields.name} label={words.name} hint={words.nameHint} autoComplete="off" />
      <FileField field={fields.file} label={words.file} hint={words.fileHint} accept={TYPES} />
      <div className="flex flex-wrap gap-2.5">
        <Button look="primary" aria-disabled={reading}>
          {reading ? words.reading : words.read}
        </Button>
        <Link className="btn btn-quiet" to={listPath}>
          {words.cancel}
        </Link>
      </div>
    </Form>
  )
}
