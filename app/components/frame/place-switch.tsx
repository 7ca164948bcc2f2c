import { Link, useLocation } from 'react-router'
import { Icon } from '~/components/ui/icon'

export interface PlaceLink {
  label: string
  note?: string
  to: string
  here: boolean
}

/** Where one is: a team, or a book with its car as a note; and the places beside it. */
export interface Place {
  label: string
  note?: string
  others: readonly PlaceLink[]
}

/** The name of the place; where there are others it opens the list of them, without JavaScript as well. */
export function PlaceSwitch({ place }: { place: Place }) {
  const { key } = useLocation()
  const name = (
    <>
      <span className="min-w-0 truncate">{place.label}</span>
      {place.note && <span className="truncate font-normal text-ink-muted max-[799px]:hidden">{place.note}</span>}
    </>
  )
  if (place.others.length === 0) return <span className="bar-place min-w-0">{name}</span>
  return (
    <details key={key} className="relative min-w-0">
      <summary className="bar-place min-w-0 cursor-pointer list-none max-[799px]:h-12 [&::-webkit-details-marker]:hidden">
        {name}
        <Icon name="down" />
      </summary>
      <ul className="absolute top-full left-2 z-20 mt-1 max-h-[70dvh] w-max max-w-[min(380px,80vw)] min-w-56 overflow-y-auto rounded-lg border border-rule-strong bg-surface py-1 shadow-(--lift-shadow)">
        {place.others.map((other) => (
          <li key={other.to}>
            <Link
              to={other.to}
              aria-current={other.here ? 'true' : undefined}
              className="flex min-h-9 items-center gap-2 px-3.5 py-1 no-underline hover:bg-orange-tint aria-current:font-bold max-[799px]:min-h-12"
            >
              {other.label}
              {other.note && <span className="font-normal text-ink-muted">{other.note}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </details>
  )
}
