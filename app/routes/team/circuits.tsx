import { href } from 'react-router'
import { may } from '~/book/may'
import { CircuitList } from '~/components/circuit/circuit-list'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { readCircuits } from '~/db/read-circuits.server'
import { dbContext } from '~/middleware/context'
import { layOutCentreline } from '~/middleware/lay-out-geometry.server'
import { allow } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { circuitWords as words } from '~/words/circuits'
import { teamWords } from '~/words/team'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/circuits'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

export async function loader({ context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'circuit.read')
  const circuits = await readCircuits(context.get(dbContext), actor)
  await Promise.all(circuits.map(({ layout }) => layOutCentreline(context, actor, layout.centreline)))
  return {
    team: team.name,
    mayChange: may(actor, 'circuit.change').ok,
    circuits: circuits.map(({ slug, name, layout, corners, books }) => ({ slug, name, layout, corners, books })),
  }
}

export default function Circuits({ loaderData: { circuits, mayChange }, params }: Route.ComponentProps) {
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
      {circuits.length === 0 ? (
        <Empty lead={words.none} question={words.noneQuestion}>
          {bringIn || <p className="muted">{teamWords.deskOnly}</p>}
        </Empty>
      ) : (
        <CircuitList team={params.team} circuits={circuits} />
      )}
    </PageBody>
  )
}
