import { href, Outlet } from 'react-router'
import { BookFrame } from '~/components/frame/book-frame'
import { ProblemPage } from '~/components/frame/problem-page'
import { frameRevalidates } from '~/components/frame/revalidation'
import { SignOutButton } from '~/components/frame/sign-out-button'
import { book, bookContext } from '~/middleware/book.server'
import { teamContext } from '~/middleware/team.server'
import { bookFrameWords as words } from '~/words/book-frame'
import type { Route } from './+types/layout'

export const middleware: Route.MiddlewareFunction[] = [book]

/** The frame's data. A layout that guards has a loader, else a navigation in the browser would not pass its guard. */
export function loader({ context }: Route.LoaderArgs) {
  const view = context.get(bookContext)
  const { team } = context.get(teamContext)
  return {
    team: { slug: team.slug, name: team.name },
    book: { slug: view.book.slug, name: view.book.name, archived: view.book.archived },
    car: view.car.name,
    tabs: view.corners.map((corner) => ({ number: corner.number, name: corner.name })),
  }
}

export const shouldRevalidate = frameRevalidates

export default function BookLayout({ loaderData, params }: Route.ComponentProps) {
  return (
    <Frame {...loaderData} number={'number' in params ? String(params.number) : null}>
      <Outlet />
    </Frame>
  )
}

type FrameData = Awaited<ReturnType<typeof loader>>

function Frame({
  team,
  book: { slug, name, archived },
  car,
  tabs,
  number,
  children,
}: FrameData & { number: string | null; children: React.ReactNode }) {
  const at = { team: team.slug, book: slug }
  const overview = href('/teams/:team/books/:book', at)
  return (
    <BookFrame
      place={{ label: name, note: archived ? `${car}, ${words.archived}` : car, others: [] }}
      nav={[
        { label: team.name, to: href('/teams/:team', { team: team.slug }), end: true },
        { label: words.book, to: overview },
      ]}
      right={<SignOutButton />}
      tabsLabel={words.tabs}
      tabs={[
        { label: words.all, name: words.wholeCircuit, to: overview, here: number === null },
        ...tabs.map((tab) => ({
          label: tab.number,
          name: `${tab.number}, ${tab.name}`,
          to: href('/teams/:team/books/:book/corners/:number', { ...at, number: tab.number }),
          here: tab.number === number,
        })),
      ]}
    >
      {children}
    </BookFrame>
  )
}

export function ErrorBoundary({ error, loaderData, params }: Route.ErrorBoundaryProps) {
  const problem = (
    <ProblemPage error={error} to={href('/teams/:team', { team: params.team ?? '' })} label={words.toTeam} />
  )
  return loaderData ? (
    <Frame {...loaderData} number={null}>
      {problem}
    </Frame>
  ) : (
    problem
  )
}
