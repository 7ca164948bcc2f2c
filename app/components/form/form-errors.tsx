import type { FormMetadata } from '@conform-to/react'

/** What a form as a whole met: the title of the problem, then what to do. */
export function FormErrors({ form }: { form: Pick<FormMetadata, 'errors' | 'errorId'> }) {
  if (!form.errors?.length) return null
  const [title, ...rest] = form.errors
  return (
    <div id={form.errorId} role="alert" className="problem mt-2">
      <strong>{title}</strong>
      {rest.map((line) => (
        <p key={line}>{line}</p>
      ))}
    </div>
  )
}
