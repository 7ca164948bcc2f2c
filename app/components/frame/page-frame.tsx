import type { ReactNode } from 'react'
import { TopBar, type TopBarProps } from './top-bar'

/** A team's page: the bar, and below it what the page holds. */
export function PageFrame({ children, ...bar }: TopBarProps & { children: ReactNode }) {
  return (
    <div className="page-alone">
      <TopBar {...bar} />
      {children}
    </div>
  )
}

/** The head of a page: its name, one line on it, and what may be begun here. */
export function PageHead({ title, lead, children }: { title: string; lead?: string; children?: ReactNode }) {
  return (
    <div className="flex flex-wrap items-end justify-between gap-x-7 gap-y-3 pb-5">
      <div className="min-w-0">
        <h1 className="h1 wrap-anywhere">{title}</h1>
        {lead && <p className="mt-1 text-ink-muted">{lead}</p>}
      </div>
      {children}
    </div>
  )
}

/** The body of a team's page: as wide as reading allows, with the gutters of the page. */
export function PageBody({ children, width = 'wide' }: { children: ReactNode; width?: 'wide' | 'form' }) {
  const limit = width === 'form' ? 'max-w-[560px]' : 'max-w-[1440px]'
  return <main className={`w-full px-4 pt-7 pb-11 min-[800px]:px-14 ${limit}`}>{children}</main>
}
