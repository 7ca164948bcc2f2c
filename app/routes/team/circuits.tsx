import { href } from 'react-router'
import { may } from '~/book/may'
import { CircuitList, CircuitPages } from '~/components/circuit/circuit-list'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { readCircuits } from '~/db/read-circuits.server'
import { dbContext } from '~/middleware/context'
import { allow } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { circuitWords as words } from '~/words/circuits'
import { teamWords } from '~/words/team'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/circuits'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

/** The page asked for, the first for anything else. */
const pageIn = (url: URL) => Number(/^[1-9]\d{0,3}$/.exec(url.searchParams.get('page') ?? '')?.[0] ?? 1)

export async function loader({ url, context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'circuit.read')
  const page = pageIn(url)
  const { entries, goesOn } = await readCircuits(context.get(dbContext), actor, page)
  return {
    team: team.name,
    mayChange: may(actor, 'circuit.change').ok,
    circuits: entries,
    page,
    goesOn,
  }
}

export default function Circuits({ loaderData: { circuits, mayChange, page, goesOn }, params }: Route.ComponentProps) {
  const bringIn = mayChange && (
    <ButtonLink look={circuits.length === 0 ? 'go' : 'plain'} to={href('/teams/:team/circuits/import', params)}>
      {words.bringIn}
    </ButtonLink>
  )
  return (
    <PageBody>
      <PageHead title={words.title} lead={words.lead}>
        {circuits.length > 0 && bringIn}
      </PageHead>
      {circuits.length === 0 && page === 1 ? (
        <Empty lead={words.none} question={words.noneQuestion}>
          {bringIn || <p className="muted">{teamWords.deskOnly}</p>}
        </Empty>
      ) : (
        <>
          <CircuitList team={params.team} circuits={circuits} />
          <CircuitPages page={page} goesOn={goesOn} />
        </>
      )}
    </PageBody>
  )
}
