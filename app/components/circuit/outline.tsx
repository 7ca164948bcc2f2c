import { Suspense } from 'react'
import type { GeometryHash } from '~/book/ids'
import { useCentreline } from '~/components/geometry/geometry-store'
import { linePath } from '~/draw/display-list'
import { simplifyRing } from '~/draw/lines'
import { circuitWords } from '~/words/circuits'

interface OutlineProps {
  team: string
  name: string
  centreline: GeometryHash
}

const WIDTH = 120
const HEIGHT = 76
const EDGE = 5
/** Detail that is dropped, px. */
const TOLERANCE = 0.3

/** A circuit's road in the small, north up, for a list. */
export function CircuitOutline(props: OutlineProps) {
  return (
    <span className="block h-19 w-30 flex-none">
      <Suspense>
        <Outline {...props} />
      </Suspense>
    </span>
  )
}

function Outline({ team, name, centreline }: OutlineProps) {
  const { x, y } = useCentreline(team, centreline)
  const [west, east] = [x.reduce((a, b) => Math.min(a, b)), x.reduce((a, b) => Math.max(a, b))]
  const [south, north] = [y.reduce((a, b) => Math.min(a, b)), y.reduce((a, b) => Math.max(a, b))]
  const scale = Math.min((WIDTH - 2 * EDGE) / (east - west || 1), (HEIGHT - 2 * EDGE) / (north - south || 1))
  const points = Array.from(
    x,
    (value, i) =>
      [WIDTH / 2 + (value - (west + east) / 2) * scale, HEIGHT / 2 - (y[i]! - (south + north) / 2) * scale] as const,
  )
  return (
    <svg
      width={WIDTH}
      height={HEIGHT}
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={circuitWords.outline(name)}
    >
      <path
        d={linePath(simplifyRing(points, TOLERANCE), true)}
        fill="none"
        stroke="var(--asphalt-dark)"
        strokeWidth="3"
        strokeLinejoin="round"
      />
    </svg>
  )
}
