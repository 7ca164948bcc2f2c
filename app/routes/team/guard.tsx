import { href, Outlet, redirect } from 'react-router'
import { OutsideFrame } from '~/components/frame/outside-frame'
import { ProblemPage } from '~/components/frame/problem-page'
import { frameRevalidates } from '~/components/frame/revalidation'
import { readTeamsOf } from '~/db/read-people.server'
import { dbContext } from '~/middleware/context'
import { personContext } from '~/middleware/person.server'
import { team, teamContext } from '~/middleware/team.server'
import { frameWords } from '~/words/frame'
import type { Route } from './+types/guard'

export const middleware: Route.MiddlewareFunction[] = [team]

/** The frame's data. A layout that guards has a loader, else a navigation in the browser would not pass its guard. */
export async function loader({ context }: Route.LoaderArgs) {
  const { team, role, actor } = context.get(teamContext)
  const person = context.get(personContext)
  if (!person) throw redirect(href('/sign-in'))
  const teams = await readTeamsOf(context.get(dbContext), actor.person)
  return {
    team: { slug: team.slug, name: team.name },
    role,
    person: { name: person.name },
    teams: teams.map(({ team: { slug, name } }) => ({ slug, name })),
  }
}

export const shouldRevalidate = frameRevalidates

export default function TeamGuard() {
  return <Outlet />
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return (
    <OutsideFrame>
      <ProblemPage error={error} to={href('/teams')} label={frameWords.toTeams} />
    </OutsideFrame>
  )
}
