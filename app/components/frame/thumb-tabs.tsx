import { Link } from 'react-router'

export interface ThumbTab {
  /** "All", "3", "7A". */
  label: string
  /** What a screen reader says: "3, Lookout". */
  name: string
  to: string
  here: boolean
  /** An open question waits there: an orange dot. */
  open?: boolean
}

/** The tabs cut into a book's right edge: one for the whole circuit, one for each corner. */
export function ThumbTabs({ tabs, label }: { tabs: readonly ThumbTab[]; label: string }) {
  return (
    <nav className="tabs" aria-label={label}>
      {tabs.map((tab) => (
        <Link
          key={tab.to}
          to={tab.to}
          className={/\d/.test(tab.label) ? 'tab' : 'tab tab-word'}
          aria-label={tab.name}
          aria-current={tab.here ? 'page' : undefined}
          preventScrollReset
        >
          {tab.label}
          {tab.open && <i className="tab-dot" />}
        </Link>
      ))}
    </nav>
  )
}
