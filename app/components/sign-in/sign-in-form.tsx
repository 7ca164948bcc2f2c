import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { getZodConstraint, parseWithZod } from '@conform-to/zod/v4'
import { Form, href } from 'react-router'
import { TextField } from '~/components/form/field'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { signInWords as words } from '~/words/sign-in'
import { signInSchema } from './schema'

/** E-mail address and password. Sends to the sign-in page, wherever it stands. */
export function SignInForm({
  lastResult,
  next,
  heading: Heading = 'h2',
}: {
  lastResult?: SubmissionResult<string[]> | null
  next?: string | null
  /** The page's first heading where nothing else is on it. */
  heading?: 'h1' | 'h2'
}) {
  const [form, fields] = useForm({
    id: 'sign-in',
    lastResult,
    constraint: getZodConstraint(signInSchema),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: signInSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form
      method="post"
      action={href('/sign-in')}
      {...getFormProps(form)}
      className="rounded-lg border border-rule-strong bg-surface px-[18px] py-3.5"
    >
      <Heading className="h2">{words.title}</Heading>
      <FormErrors form={form} />
      <div className="mt-2 grid gap-2.5">
        <TextField field={fields.email} type="email" label={words.email} autoComplete="username" />
        <TextField field={fields.password} type="password" label={words.password} autoComplete="current-password" />
      </div>
      <input type="hidden" name={fields.next.name} defaultValue={fields.next.initialValue ?? next ?? ''} />
      <Button look="primary" size="large" className="mt-3.5 w-full">
        {words.button}
      </Button>
    </Form>
  )
}
