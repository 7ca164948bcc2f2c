import { useMemo } from 'react'
import { useSheetWidth } from '~/components/geometry/sheet-width'
import { LiveOverStill } from '~/components/map/live-over-still'
import { Toast } from '~/components/ui/notice'
import { cornerMap } from '~/draw/corner-map'
import { cornerMapWords, corner as words } from '~/words/corner'
import { LiveMap } from './live-map'
import type { CornerPageData } from './page-data'
import type { CornerResult } from './result'
import type { TypedPlace } from './typed-place'
import { useCornerDrawing, useFrame } from './use-corner-drawing'
import { usePlaceEdits } from './use-place-edits'

interface MapPanelProps {
  page: CornerPageData
  selected: string | null
  /** Opens the form of a new mark at this place. */
  onAdd: (place: TypedPlace) => void
  onSelect: (mark: string) => void
  /** What became of a mark that was moved on the map. */
  onResult: (result: CornerResult) => void
}

/** The map of the corner: a still picture from the server until the one to move, tap and drag on stands. */
export function MapPanel({ page, selected, onAdd, onSelect, onResult }: MapPanelProps) {
  const { name } = page.cut.corner
  const [ref, width] = useSheetWidth(page.sheet)
  const frame = useFrame(page)
  const edits = usePlaceEdits(page, frame, onResult)
  const { scene, reading, projection } = useCornerDrawing(page, frame, { selected, pending: edits.pending, width })
  const still = useMemo(
    () => cornerMap(scene, reading, projection, cornerMapWords(name)),
    [scene, reading, projection, name],
  )
  return (
    <>
      <div className="map-panel" ref={ref}>
        <LiveOverStill still={still} label={words.mapLabel(name)} description={words.mapDescription}>
          {(onReady) => <LiveMap {...{ page, frame, edits, scene, reading, projection, onAdd, onSelect, onReady }} />}
        </LiveOverStill>
      </div>
      {edits.isUnsent ? (
        <Toast kind="caution">
          {words.unsent}
          <button type="button" onClick={edits.sendAgain}>
            {words.sendAgain}
          </button>
        </Toast>
      ) : null}
      {page.may.add ? (
        <p className="map-hint">
          {words.mapHint} <span className="map-keys">{words.mapKeys}</span>
        </p>
      ) : null}
    </>
  )
}
