import type { ReactNode } from 'react'

/** An empty place: a piece of road, what is missing, one question, and the first thing to do. */
export function Empty({ lead, question, children }: { lead: string; question: string; children?: ReactNode }) {
  return (
    <div className="empty">
      <svg className="block w-full" height="44" viewBox="0 0 420 44" preserveAspectRatio="none" aria-hidden="true">
        <rect y="8" width="420" height="28" fill="var(--asphalt)" />
        <path d="M0 8H420M0 36H420" stroke="var(--road-edge)" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
        <path
          d="M0 22H420"
          stroke="var(--asphalt-mid)"
          strokeDasharray="10 4 1.5 4"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      <p>
        <b>{lead}</b> {question}
      </p>
      {children}
    </div>
  )
}
