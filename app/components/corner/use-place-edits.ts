import { useCallback, useEffect, useRef, useState } from 'react'
import { href, type Location, useBlocker, useNavigate, useRevalidator } from 'react-router'
import { v7 } from 'uuid'
import { changeMark, type GivenPlace, type SeenMark } from '~/book/edits'
import type { OperationId } from '~/book/ids'
import type { Ground } from '~/book/kinds'
import type { Operation, Outcome } from '~/book/operation'
import type { Place } from '~/book/place'
import type { LayoutFrame } from '~/track/layout-frame'
import { metres } from '~/track/units'
import { corner as words } from '~/words/corner'
import type { CornerPageData } from './page-data'
import {
  answered,
  isUnderWay,
  letGo,
  nextMove,
  type PlaceMove,
  type PlaceQueue,
  placeKey,
  putMove,
  sendAgain,
  withState,
} from './place-queue'
import { type CornerResult, intentResult } from './result'
import { FARTHEST_ACROSS, kmhField, seenOf, typedFrom } from './typed-place'

/** A place moved on the map and not yet confirmed by the server. */
export type PendingPlace = Pick<PlaceMove, 'mark' | 'ground' | 'at'>
export type PlaceEdits = ReturnType<typeof usePlaceEdits>

/** Presses of an arrow key within this many milliseconds are one change. */
const PAUSE = 500

/**
 * Moves of marks on the map: shown at once, sent when the hand rests, one after the other. Leaving the page waits for what is
 * under way; what cannot be sent stays and is sent again.
 */
export function usePlaceEdits(page: CornerPageData, frame: LayoutFrame, onResult: (result: CornerResult) => void) {
  const [queue, setQueue] = useState<PlaceQueue>([])
  useLettingGo(queue, setQueue)
  useSending({ page, frame, queue, setQueue, onResult })
  useStaying(queue)
  const move = (mark: string, ground: Ground, at: GivenPlace, now: boolean) => {
    const known = page.cut.corner.marks.find((one) => one.id === mark)
    if (!known) return
    if (Math.abs(at.offset) > FARTHEST_ACROSS) return onResult({ kind: 'refused', words: words.form.acrossFar })
    const id = v7() as OperationId
    const state = now ? 'waiting' : 'held'
    setQueue((before) => putMove(before, { id, mark: known, ground, at, cut: page.cut, state, operation: null }))
  }
  return {
    pending: queue as readonly PendingPlace[],
    isUnsent: queue.some((one) => one.state === 'unsent'),
    move,
    sendAgain: () => setQueue(sendAgain),
  }
}

type SetQueue = (change: (queue: PlaceQueue) => PlaceQueue) => void

/** What is held waits to be sent after a pause, or at once when the focus goes elsewhere. */
function useLettingGo(queue: PlaceQueue, setQueue: SetQueue) {
  const held = queue.findLast((one) => one.state === 'held')?.id
  useEffect(() => {
    if (held === undefined) return
    const rest = () => setQueue(letGo)
    const timer = setTimeout(rest, PAUSE)
    document.addEventListener('focusout', rest)
    return () => {
      clearTimeout(timer)
      document.removeEventListener('focusout', rest)
    }
  }, [held, setQueue])
}

interface Sending {
  page: CornerPageData
  frame: LayoutFrame
  queue: PlaceQueue
  setQueue: SetQueue
  onResult: (result: CornerResult) => void
}

/** Sends the queue to the book's write path. Each move starts from what the last answer said of its place, or the page says. */
function useSending({ page, frame, queue, setQueue, onResult }: Sending) {
  const { revalidate } = useRevalidator()
  const known = useRef(new Map<string, { place: Place; rev: number }>())
  const send = useCallback(
    async (move: PlaceMove, operation: Operation, team: string) => {
      const outcome = await postOperation(team, move.cut.book.slug, operation)
      if (outcome === null) {
        setQueue((before) => withState(before, move.id, 'unsent', operation))
        return
      }
      const stored = operation.set[move.ground]?.to
      if (stored && outcome.kind === 'applied')
        known.current.set(placeKey(move), { place: stored as unknown as Place, rev: outcome.rev })
      setQueue((before) => withState(before, move.id, 'settled', operation))
      onResult(resultOf(move, operation, outcome, frame))
      await revalidate()
      setQueue((before) => answered(before, move.id))
    },
    [frame, onResult, revalidate, setQueue],
  )
  useEffect(() => {
    const next = nextMove(queue)
    if (!next) return
    const last = known.current.get(placeKey(next))
    const seen = seenOf(next.mark, next.ground)
    const place = last && last.rev > next.cut.book.rev ? last.place : seen.place
    const operation = next.operation ?? operationOf(next, { ...seen, place }, frame)
    setQueue((before) => (operation ? withState(before, next.id, 'sending', operation) : answered(before, next.id)))
    if (operation) void send(next, operation, page.team)
  }, [queue, frame, page.team, send, setQueue])
}

/**
 * Going elsewhere waits until what is under way has been answered; closing the window with something unsent asks first. The
 * way is taken anew, not resumed: reading the page again meanwhile makes the router forget what it held back.
 */
function useStaying(queue: PlaceQueue) {
  const stays = isUnderWay(queue)
  const navigate = useNavigate()
  const blocker = useBlocker(stays)
  const to = useRef<Location | null>(null)
  useEffect(() => {
    if (blocker.state === 'blocked') to.current = blocker.location
    if (stays || !to.current) return
    const next = to.current
    to.current = null
    navigate(next)
  }, [blocker, stays, navigate])
  const isUnsent = queue.some((one) => one.state !== 'settled')
  useEffect(() => {
    if (!isUnsent) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [isUnsent])
}

function operationOf(move: PlaceMove, seen: SeenMark, frame: LayoutFrame): Operation | null {
  const making = {
    id: move.id,
    madeAt: new Date().toISOString(),
    scope: { kind: 'book', id: move.cut.book.id } as const,
  }
  return changeMark(making, move.mark.id, move.ground, seen, { ...seen, at: move.at }, frame)
}

/** The book's answer, null where there was none: no connection, or no longer signed in. */
async function postOperation(team: string, book: string, operation: Operation): Promise<Outcome | null> {
  try {
    const response = await fetch(href('/teams/:team/books/:book/operations', { team, book }), {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(operation),
    })
    const isAnswer = !response.redirected && response.headers.get('content-type')?.includes('application/json')
    return isAnswer ? ((await response.json()) as Outcome) : null
  } catch {
    return null
  }
}

function resultOf(move: PlaceMove, operation: Operation, outcome: Outcome, frame: LayoutFrame): CornerResult {
  const { mark, ground, at, cut } = move
  const toDatum = metres(frame.gap(cut.corner.datum.station, at.station))
  const typed = typedFrom({ toDatum, offset: at.offset }, 3)
  const seen = seenOf(mark, ground)
  const again = {
    intent: 'change',
    mark: mark.id,
    ground,
    seen: JSON.stringify(seen),
    ...typed,
    manner: mark.manner ?? '',
    gear: mark.gear === null ? '' : String(mark.gear),
    speed: kmhField(mark.speed),
  }
  return intentResult(cut, { intent: 'change', mark: mark.id, ground }, operation, outcome, again)
}
