import { useEffect, useRef, useState } from 'react'
import { useFetcher } from 'react-router'
import { v7 } from 'uuid'
import type { GivenPlace } from '~/book/edits'
import type { Ground } from '~/book/kinds'
import type { MarkView } from '~/book/view'
import type { LayoutFrame } from '~/track/layout-frame'
import { metres } from '~/track/units'
import type { CornerPageData } from './page-data'
import type { CornerResult } from './result'
import { kmhField, seenOf, typedFrom } from './typed-place'

/** A place moved on the map and not yet confirmed by the server. */
export interface PendingPlace {
  mark: string
  ground: Ground
  at: GivenPlace
}

export type PlaceEdits = ReturnType<typeof usePlaceEdits>

/** Presses of an arrow key within this many milliseconds are one change. */
const PAUSE = 500

/**
 * Moves of marks on the map: shown at once, sent when the hand rests, one after the other, so that each starts from what the
 * server has. What fails comes back as a result; the mark then stands where the book has it.
 */
export function usePlaceEdits(page: CornerPageData, frame: LayoutFrame, onResult: (result: CornerResult) => void) {
  const fetcher = useFetcher<{ result: CornerResult | null }>()
  const [pending, setPending] = useState<PendingPlace | null>(null)
  const [rested, setRested] = useState(false)
  const sent = useRef<PendingPlace | null>(null)
  const underWay = useRef(false)
  const idle = fetcher.state === 'idle'

  useEffect(() => {
    if (!pending || rested) return
    const rest = () => setRested(true)
    const timer = setTimeout(rest, PAUSE)
    document.addEventListener('focusout', rest)
    return () => {
      clearTimeout(timer)
      document.removeEventListener('focusout', rest)
    }
  }, [pending, rested])

  useEffect(() => {
    if (!idle) {
      underWay.current = true
      return
    }
    if (sent.current) {
      if (!underWay.current) return
      underWay.current = false
      const answered = sent.current === pending
      sent.current = null
      if (answered) {
        setPending(null)
        return
      }
    }
    const mark = page.cut.corner.marks.find((one) => one.id === pending?.mark)
    if (!pending || !rested || !mark) return
    sent.current = pending
    underWay.current = false
    fetcher.submit(changeFields(page, frame, mark, pending), { method: 'post' })
  }, [idle, pending, rested, page, frame, fetcher])

  const result = idle ? fetcher.data?.result : null
  useEffect(() => {
    if (result) onResult(result)
  }, [result, onResult])

  return {
    pending,
    /** `now`: the hand has let go; otherwise more may follow. */
    move: (place: PendingPlace, now: boolean) => {
      setPending(place)
      setRested(now)
    },
  }
}

function changeFields(page: CornerPageData, frame: LayoutFrame, mark: MarkView, { ground, at }: PendingPlace) {
  const toDatum = metres(frame.gap(page.cut.corner.datum.station, at.station))
  return {
    intent: 'change',
    operation: v7(),
    mark: mark.id,
    ground,
    seen: JSON.stringify(seenOf(mark, ground)),
    ...typedFrom({ toDatum, offset: at.offset }, 3),
    manner: mark.manner ?? '',
    gear: mark.gear === null ? '' : String(mark.gear),
    speed: kmhField(mark.speed),
  }
}
