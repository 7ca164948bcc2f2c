import { Form } from 'react-router'
import { Button } from '~/components/ui/button'
import { cornerLabels as labels } from '~/words/corner-labels'
import { Hidden } from './mark-form'
import type { CornerPageData } from './page-data'

const firstName = (page: CornerPageData, person: string | null) =>
  (page.names[person ?? ''] ?? labels.former).split(' ')[0]

/** The latest changes of this corner's marks; each may be taken back by who may change the mark. */
export function ChangesList({ page }: { page: CornerPageData }) {
  if (page.changes.length === 0) return null
  return (
    <section aria-labelledby="changes-head">
      <h2 className="h2" id="changes-head">
        {labels.changes}
      </h2>
      <ul className="changes">
        {page.changes.map((change) => (
          <li key={change.operation}>
            <span>{change.words}</span>
            <span className="muted">{firstName(page, change.by)}</span>
            {change.mayUndo ? (
              <Form method="post" preventScrollReset>
                <Hidden intent="undo" change={change.operation} />
                <Button look="quiet" size="small" aria-label={labels.undoOf(change.words)}>
                  {labels.undo}
                </Button>
              </Form>
            ) : null}
          </li>
        ))}
      </ul>
    </section>
  )
}

/** Changes of others' marks that wait for the coach. */
export function ProposalsList({ page }: { page: CornerPageData }) {
  if (page.proposals.length === 0) return null
  return (
    <section aria-labelledby="proposals-head">
      <h2 className="h2" id="proposals-head">
        {labels.proposed}
      </h2>
      <ul className="changes">
        {page.proposals.map((proposal) => (
          <li key={proposal.id}>
            <span>{proposal.words}</span>
            <span className="muted">{firstName(page, proposal.by)}</span>
            {page.may.decide ? (
              <Form method="post" preventScrollReset className="decide">
                <Hidden intent="decide" proposal={proposal.id} />
                <Button size="small" name="verdict" value="accept">
                  {labels.accept}
                </Button>
                <Button look="quiet" size="small" name="verdict" value="decline">
                  {labels.decline}
                </Button>
              </Form>
            ) : (
              <span className="muted">{labels.waits}</span>
            )}
          </li>
        ))}
      </ul>
    </section>
  )
}
