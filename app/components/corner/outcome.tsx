import { Form, Link } from 'react-router'
import { Toast } from '~/components/ui/notice'
import { cornerLabels as labels } from '~/words/corner-labels'
import { Hidden } from './mark-form'
import type { CornerResult } from './result'

interface OutcomeProps {
  result: CornerResult
  /** Fresh id for what is sent from here. */
  operation: string
  closeTo: string
  /** Takes the outcome off the page. */
  dismiss: () => void
}

/** What became of the change that was just sent: done with its undo, refused, or two versions to choose from. */
export function Outcome({ result, operation, closeTo, dismiss }: OutcomeProps) {
  if (result.kind === 'refused') return <Toast kind="danger">{result.words}</Toast>
  if (result.kind === 'done')
    return (
      <Toast kind="done">
        {result.words}
        {result.undo ? (
          <Form method="post" preventScrollReset className="toast-form">
            <Hidden intent="undo" change={result.undo} />
            <button type="submit">{labels.undo}</button>
          </Form>
        ) : null}
      </Toast>
    )
  return <Conflict {...{ result, operation, closeTo, dismiss }} />
}

type ConflictProps = OutcomeProps & { result: Extract<CornerResult, { kind: 'conflict' }> }

function Conflict({ result, operation, closeTo, dismiss }: ConflictProps) {
  return (
    <div role="alert" className="conflict">
      <p>
        <b>{result.words}</b>
      </p>
      <dl>
        <dt>{labels.theirs}</dt>
        <dd>{result.theirs}</dd>
        <dd>
          <Link className="btn" to={closeTo} replace preventScrollReset onClick={dismiss}>
            {labels.keepTheirs}
          </Link>
        </dd>
        <dt>{labels.yours}</dt>
        <dd>{result.mine}</dd>
        <dd>
          <Form method="post" preventScrollReset>
            <Hidden {...result.again} operation={operation} />
            <button type="submit" className="btn">
              {labels.keepYours}
            </button>
          </Form>
        </dd>
      </dl>
    </div>
  )
}
