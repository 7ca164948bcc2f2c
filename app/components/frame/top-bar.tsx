import type { ReactNode } from 'react'
import { href, Link, NavLink } from 'react-router'
import { BrandMark } from '~/components/ui/brand'
import { frameWords } from '~/words/frame'
import { type Place, PlaceSwitch } from './place-switch'

export interface NavItem {
  label: string
  to: string
  /** Only the very page counts as open, not the pages below it. */
  end?: boolean
}

export interface TopBarProps {
  place: Place
  nav: readonly NavItem[]
  right?: ReactNode
}

/**
 * The bar over a team's and a book's pages: brand, the place one is in with the others to go to, the sections of the place,
 * and at the right end what belongs to the page. On a phone the sections take a row of their own.
 */
export function TopBar({ place, nav, right }: TopBarProps) {
  return (
    <header className="bar max-[799px]:h-auto max-[799px]:min-h-[52px] max-[799px]:flex-wrap max-[799px]:gap-y-0 max-[799px]:overflow-visible">
      <Link to={href('/teams')} className="brand max-[799px]:min-h-12" aria-label={frameWords.allTeams}>
        <BrandMark size={27} />
        <span className="max-[799px]:hidden">Turnstone</span>
      </Link>
      <PlaceSwitch place={place} />
      <span className="spring min-[800px]:hidden" />
      <nav
        className="nav max-[799px]:order-last max-[799px]:-mx-3 max-[799px]:h-12 max-[799px]:w-[calc(100%+24px)] max-[799px]:overflow-x-auto max-[799px]:border-t max-[799px]:border-rule"
        aria-label={frameWords.sections}
      >
        {nav.map(({ label, to, end }) => (
          <NavLink key={to} to={to} end={end}>
            {label}
          </NavLink>
        ))}
      </nav>
      <span className="spring max-[799px]:hidden" />
      {right}
    </header>
  )
}
