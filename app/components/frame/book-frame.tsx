import type { ReactNode } from 'react'
import { type ThumbTab, ThumbTabs } from './thumb-tabs'
import { TopBar, type TopBarProps } from './top-bar'

interface BookFrameProps extends TopBarProps {
  tabs: readonly ThumbTab[]
  tabsLabel: string
  children: ReactNode
}

/** A book's page lying on the desk, with the thumb tabs on its right edge. */
export function BookFrame({ tabs, tabsLabel, children, ...bar }: BookFrameProps) {
  return (
    <div className="book">
      <div className="page">
        <TopBar {...bar} />
        {children}
      </div>
      <ThumbTabs tabs={tabs} label={tabsLabel} />
    </div>
  )
}
