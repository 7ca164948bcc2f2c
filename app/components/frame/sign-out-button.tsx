import { Form, href } from 'react-router'
import { Button } from '~/components/ui/button'
import { signInWords } from '~/words/sign-in'

export function SignOutButton() {
  return (
    <Form method="post" action={href('/sign-out')}>
      <Button look="quiet" size="small">
        {signInWords.signOut}
      </Button>
    </Form>
  )
}
