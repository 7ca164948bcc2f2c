import { linePath } from '~/draw/display-list'
import { boundsOf } from '~/draw/lines'
import { circuitWords } from '~/words/circuits'

interface OutlineProps {
  name: string
  /** Metres east and north by turns, a closed ring whose first place is not repeated. */
  outline: readonly number[]
}

const WIDTH = 120
const HEIGHT = 76
const EDGE = 5

/** A circuit's road in the small, north up, for a list. */
export function CircuitOutline({ name, outline }: OutlineProps) {
  return (
    <svg
      className="block flex-none"
      width={WIDTH}
      height={HEIGHT}
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={circuitWords.outline(name)}
    >
      <path
        d={linePath(onSheet(outline), true)}
        fill="none"
        stroke="var(--asphalt-dark)"
        strokeWidth="3"
        strokeLinejoin="round"
      />
    </svg>
  )
}

/** The ring in px, as large as the sheet lets it be. */
function onSheet(outline: readonly number[]) {
  const places = Array.from({ length: outline.length / 2 }, (_, i) => [outline[2 * i]!, outline[2 * i + 1]!] as const)
  const { x, y, width, height } = boundsOf(places)
  const scale = Math.min((WIDTH - 2 * EDGE) / (width || 1), (HEIGHT - 2 * EDGE) / (height || 1))
  return places.map(
    ([east, north]) =>
      [WIDTH / 2 + (east - x - width / 2) * scale, HEIGHT / 2 - (north - y - height / 2) * scale] as const,
  )
}
