import { href, Outlet, useRouteLoaderData } from 'react-router'
import { ProblemPage } from '~/components/frame/problem-page'
import { TeamFrame } from '~/components/team/team-frame'
import { frameWords } from '~/words/frame'
import type { Route } from './+types/layout'
import type { loader as guardLoader } from './guard'

const useGuard = () => useRouteLoaderData<typeof guardLoader>('routes/team/guard')

export default function TeamLayout() {
  const frame = useGuard()
  return frame ? (
    <TeamFrame {...frame}>
      <Outlet />
    </TeamFrame>
  ) : (
    <Outlet />
  )
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  const frame = useGuard()
  if (!frame) return <ProblemPage error={error} />
  const { slug } = frame.team
  return (
    <TeamFrame {...frame}>
      <ProblemPage error={error} to={href('/teams/:team', { team: slug })} label={frameWords.toTeam} />
    </TeamFrame>
  )
}
