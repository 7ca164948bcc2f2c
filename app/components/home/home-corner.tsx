import { useDeferredValue, useMemo } from 'react'
import { useSheetWidth } from '~/components/geometry/sheet-width'
import { cornerMap, cornerProjection } from '~/draw/corner-map'
import { Drawing } from '~/draw/svg/drawing'
import { metres } from '~/track/units'
import { homeWords } from '~/words/home'
import { formatMetres } from '~/words/measures'
import { sampleReading, sampleScene, sampleStretch } from './sample-corner'

const PHONE_UNDER = 600
const words = { metres: (value: number) => formatMetres(metres(value)) }

/** One corner as a book shows it, across the page. */
export function HomeCorner({ sheet }: { sheet: number }) {
  const [ref, measured] = useSheetWidth(sheet)
  const width = useDeferredValue(measured)
  const list = useMemo(() => {
    const height = width < PHONE_UNDER ? 300 : Math.round(Math.min(430, width * 0.32))
    const projection = cornerProjection(sampleScene.road, sampleStretch, { width, height })
    return cornerMap(sampleScene, sampleReading(width < PHONE_UNDER ? 'phone' : 'desk'), projection, words)
  }, [width])
  return (
    <div ref={ref} className="overflow-hidden border-y border-rule-strong">
      <Drawing list={list} label={homeWords.drawing} />
    </div>
  )
}
