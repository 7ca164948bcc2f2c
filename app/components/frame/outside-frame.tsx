import type { ReactNode } from 'react'
import { href, Link } from 'react-router'
import { BrandMark } from '~/components/ui/brand'

/** The frame of the pages before one is in a team: the brand, and on the right what may be done. */
export function OutsideFrame({ children, right }: { children: ReactNode; right?: ReactNode }) {
  return (
    <div className="page-alone flex flex-col">
      <header className="flex min-h-16 flex-wrap items-center gap-x-7 px-4 min-[800px]:px-14">
        <Link to={href('/')} className="brand min-h-11 gap-[11px] text-[21px]">
          <BrandMark size={32} />
          Turnstone
        </Link>
        <span className="spring" />
        {right}
      </header>
      {children}
    </div>
  )
}
