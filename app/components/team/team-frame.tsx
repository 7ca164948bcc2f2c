import type { ReactNode } from 'react'
import { href } from 'react-router'
import type { Role } from '~/book/kinds'
import { PageFrame } from '~/components/frame/page-frame'
import { SignOutButton } from '~/components/frame/sign-out-button'
import { frameWords } from '~/words/frame'
import { roleWord } from '~/words/kinds'

/** What the frame of a team's pages is drawn from. */
export interface TeamFrameData {
  team: { slug: string; name: string }
  role: Role
  person: { name: string }
  teams: readonly { slug: string; name: string }[]
}

/** The sections of a team. */
export const teamNav = (team: string) => [
  { label: frameWords.team, to: href('/teams/:team', { team }), end: true },
  { label: frameWords.books, to: href('/teams/:team/books', { team }) },
  { label: frameWords.circuits, to: href('/teams/:team/circuits', { team }) },
  { label: frameWords.cars, to: href('/teams/:team/cars', { team }) },
]

/** The frame of a team's pages: team switch, sections, who is signed in. */
export function TeamFrame({ team, role, person, teams, children }: TeamFrameData & { children: ReactNode }) {
  const others = teams.map(({ slug, name }) => ({
    label: name,
    to: href('/teams/:team', { team: slug }),
    here: slug === team.slug,
  }))
  return (
    <PageFrame
      place={{ label: team.name, others: others.length > 1 ? others : [] }}
      nav={teamNav(team.slug)}
      right={
        <div className="flex items-center gap-3">
          <span className="sm max-[799px]:sr-only">
            {person.name} <span className="muted">{roleWord(role)}</span>
          </span>
          <SignOutButton />
        </div>
      }
    >
      {children}
    </PageFrame>
  )
}
