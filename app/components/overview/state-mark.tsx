import type { CornerState } from '~/book/cuts'
import { StateGlyph } from '~/draw/svg/glyph'

/** The sign of a corner's state, beside its word: a pencil, a footprint, a mark over its bar; nothing yet is an open ring. */
export function StateMark({ state }: { state: CornerState }) {
  if (state === 'draft') return <StateGlyph icon="pencil" />
  if (state === 'seen') return <StateGlyph icon="foot" />
  return (
    <svg
      width="16"
      height="16"
      viewBox="0 0 20 20"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      aria-hidden="true"
    >
      {state === 'driven' ? (
        <>
          <path d="M10 2.6l5.4 5.4-5.4 5.4-5.4-5.4z" fill="currentColor" strokeLinejoin="round" />
          <path d="M4 17.2h12" strokeWidth="2" />
        </>
      ) : (
        <circle cx="10" cy="10" r="5.4" strokeDasharray={state === 'inherited' ? undefined : '2.6 2'} />
      )}
    </svg>
  )
}
