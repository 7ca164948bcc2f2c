import { PageBody, PageHead } from '~/components/frame/page-frame'
import { allow } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/home'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(loaderData?.team.name ?? '') }]

export function loader({ context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'team.read')
  return { team: { name: team.name } }
}

export default function TeamHome({ loaderData: { team } }: Route.ComponentProps) {
  return (
    <PageBody>
      <PageHead title={team.name} />
    </PageBody>
  )
}
