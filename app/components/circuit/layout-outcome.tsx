import { Form, Link } from 'react-router'
import { Button } from '~/components/ui/button'
import { Toast } from '~/components/ui/notice'
import { circuitWords as words } from '~/words/circuits'
import type { LayoutOutcome } from './layout-data'

/** What became of the change that was just sent: done with its undo, refused, or two versions to choose from. */
export function Outcome({ outcome, here }: { outcome: LayoutOutcome; here: string }) {
  if (outcome.kind === 'refused') return <Toast kind="danger">{outcome.words}</Toast>
  if (outcome.kind === 'conflict') return <Conflict outcome={outcome} here={here} />
  const { operation, batch } = outcome.undo ?? {}
  return (
    <Toast kind="done">
      <span>{outcome.words}</span>
      {outcome.undo && (
        <Form method="post" preventScrollReset className="ml-auto">
          {operation && <input type="hidden" name="operation" value={operation} />}
          {batch && <input type="hidden" name="batch" value={batch} />}
          <button type="submit" name="intent" value="undo" className="min-h-11 min-[800px]:min-h-0">
            {words.undo}
          </button>
        </Form>
      )}
    </Toast>
  )
}

/** Both versions side by side. The one typed is still in the form, and is sent from there. */
function Conflict({ outcome, here }: { outcome: Extract<LayoutOutcome, { kind: 'conflict' }>; here: string }) {
  return (
    <div role="alert" className="problem">
      <strong>{outcome.title}</strong>
      {outcome.choices.map(({ field, theirs, mine }) => (
        <dl key={field} className="mt-1 grid max-w-md grid-cols-2 gap-x-5">
          <div>
            <dt className="sm muted">
              {field}, {words.theirs}
            </dt>
            <dd className="wrap-anywhere">{theirs}</dd>
          </div>
          <div>
            <dt className="sm muted">
              {field}, {words.yours}
            </dt>
            <dd className="wrap-anywhere">{mine}</dd>
          </div>
        </dl>
      ))}
      <div className="mt-2.5 flex flex-wrap gap-2.5">
        {outcome.form === 'corners' ? (
          <>
            <Button form="corners" name="skip" value={outcome.corner}>
              {words.keepTheirs}
            </Button>
            <Button form="corners" name="intent" value="corners">
              {words.keepYours}
            </Button>
          </>
        ) : (
          <>
            <Link className="btn" to={here} replace preventScrollReset>
              {words.keepTheirs}
            </Link>
            <Form method="post" preventScrollReset>
              <input type="hidden" name="startAlong" value={outcome.again.startAlong} />
              <input type="hidden" name="seenStart" value={outcome.again.seenStart} />
              <Button name="intent" value="start-at">
                {words.keepYours}
              </Button>
            </Form>
          </>
        )}
      </div>
    </div>
  )
}
