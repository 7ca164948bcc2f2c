import { href, Link, redirect } from 'react-router'
import { OutsideFrame } from '~/components/frame/outside-frame'
import { SignOutButton } from '~/components/frame/sign-out-button'
import { Empty } from '~/components/ui/empty'
import { Icon } from '~/components/ui/icon'
import { readTeamsOf } from '~/db/read-people.server'
import { dbContext } from '~/middleware/context'
import { personContext, signedIn, signInPath } from '~/middleware/person.server'
import { teamWords } from '~/words/team'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/teams'

export const meta = () => [{ title: pageTitle(teamWords.teams) }]

export const middleware: Route.MiddlewareFunction[] = [signedIn]

/** Whoever is in one team only is sent on to it. */
export async function loader({ request, url, context }: Route.LoaderArgs) {
  const person = context.get(personContext)
  if (!person) throw redirect(signInPath(request, url))
  const teams = await readTeamsOf(context.get(dbContext), person.id)
  const [only] = teams
  if (only && teams.length === 1) throw redirect(href('/teams/:team', { team: only.team.slug }))
  return { name: person.name, teams: teams.map(({ team: { slug, name }, role }) => ({ slug, name, role })) }
}

export default function Teams({ loaderData: { teams } }: Route.ComponentProps) {
  return (
    <OutsideFrame right={<SignOutButton />}>
      <main className="w-full max-w-[640px] px-4 pt-7 pb-11 min-[800px]:px-14">
        <h1 className="h1 pb-5">{teamWords.teams}</h1>
        {teams.length === 0 && <Empty lead={teamWords.noTeam} question={teamWords.noTeamQuestion} />}
        {teams.length > 0 && (
          <ul className="border-t border-rule-strong">
            {teams.map(({ slug, name, role }) => (
              <li key={slug} className="border-b border-rule">
                <Link
                  to={href('/teams/:team', { team: slug })}
                  className="flex min-h-12 items-center gap-3 no-underline hover:bg-orange-tint"
                >
                  <span className="h3">{name}</span>
                  <span className="muted">{teamWords.role(role)}</span>
                  <span className="spring" />
                  <Icon name="right" />
                </Link>
              </li>
            ))}
          </ul>
        )}
      </main>
    </OutsideFrame>
  )
}
