import type { SubmissionResult } from '@conform-to/react'
import { Suspense, useCallback, useEffect, useState } from 'react'
import { Link, useNavigate, useNavigation, useSearchParams } from 'react-router'
import { GROUNDS, type Ground } from '~/book/kinds'
import { DrawingBoundary } from '~/components/geometry/drawing-boundary'
import { Icon } from '~/components/ui/icon'
import { corner as words } from '~/words/corner'
import { cornerLabels as labels } from '~/words/corner-labels'
import { CardNotes } from './card-notes'
import { ChangesList, ProposalsList } from './changes-list'
import { CornerHead } from './corner-head'
import { MapPanel } from './map-panel'
import { AddMarkForm, ChangeMarkForm } from './mark-form'
import { MarkTable, NoMarks } from './mark-table'
import { Outcome } from './outcome'
import type { CornerPageData } from './page-data'
import type { CornerResult } from './result'
import type { TypedPlace } from './typed-place'
import './corner.css'

interface CornerPageProps {
  page: CornerPageData
  result: CornerResult | null
  lastResult: SubmissionResult<string[]> | null
}

/** One corner: map, table of marks, card, changes; beside the table the form of what is being added or changed. */
export function CornerPage({ page, result, lastResult }: CornerPageProps) {
  const { open, linkWith } = useOpenForm()
  const corner = page.cut.corner
  const { latest, setFromMap, dismiss } = useLatest(corner.id, result)
  const closeTo = linkWith({ add: null, mark: null })
  const navigate = useNavigate()
  const go = (to: string) => navigate(to, { preventScrollReset: true, replace: true })
  const onSelect = (mark: string) => go(linkWith({ mark, add: null }))
  useClosing(result, closeTo)
  const onAdd = (place: TypedPlace) => go(linkWith({ ...place, add: '1', mark: null }))
  return (
    <main className="corner-page">
      <div className="corner-main">
        <CornerHead page={page} linkWith={linkWith} />
        <DrawingBoundary className="map-panel">
          <Suspense fallback={<div className="map-panel waiting" />}>
            <MapPanel {...{ page }} selected={open.mark} onAdd={onAdd} onSelect={onSelect} onResult={setFromMap} />
          </Suspense>
        </DrawingBoundary>
        {latest ? <Outcome {...{ closeTo, dismiss }} result={latest} operation={page.ids.operation} /> : null}
        <OpenForm {...{ page, open, closeTo, lastResult }} />
        {page.lines.length > 0 ? (
          <MarkTable page={page} selected={open.mark} linkTo={(mark) => linkWith({ mark, add: null })} />
        ) : (
          <NoMarks page={page} />
        )}
        <p className="basis">
          {words.basis} {words.caution}
        </p>
      </div>
      <aside className="corner-side" aria-label={labels.cardOf(corner.name)}>
        <CardNotes page={page} />
        <ProposalsList page={page} />
        <ChangesList page={page} />
        <PreviousNext page={page} />
      </aside>
    </main>
  )
}

/** The outcome of what was sent last in this corner, by a form or from the map; it stays until something else is sent. */
function useLatest(corner: string, result: CornerResult | null) {
  const [shown, setShown] = useState({ corner, result, fromForm: result, fromMap: null as CornerResult | null })
  if (shown.corner !== corner) setShown({ corner, result, fromForm: result, fromMap: null })
  else if (shown.result !== result)
    setShown((before) => ({ ...before, result, ...(result ? { fromForm: result, fromMap: null } : {}) }))
  const setFromMap = useCallback((fromMap: CornerResult) => setShown((before) => ({ ...before, fromMap })), [])
  const dismiss = useCallback(() => setShown((before) => ({ ...before, fromForm: null, fromMap: null })), [])
  return { latest: shown.fromMap ?? shown.fromForm, setFromMap, dismiss }
}

/** A form whose change is done is closed, once the page has been read again: closing earlier would keep it as it was. */
function useClosing(result: CornerResult | null, closeTo: string) {
  const navigate = useNavigate()
  const [search] = useSearchParams()
  const isOpen = search.has('add') || search.has('mark')
  const isRead = useNavigation().state === 'idle'
  const isDone = result?.kind === 'done' && isRead
  useEffect(() => {
    if (isDone && isOpen) navigate(closeTo, { preventScrollReset: true, replace: true })
  }, [isDone, isOpen, closeTo, navigate])
}

export type LinkWith = (change: Record<string, string | null>) => string

interface OpenState {
  mark: string | null
  add: boolean
  tapped: TypedPlace | null
}

/** Which form is open stands in the address, so that it works before JavaScript and the way back closes it. */
function useOpenForm(): { open: OpenState; linkWith: LinkWith } {
  const [search] = useSearchParams()
  const linkWith: LinkWith = (change) => {
    const next = new URLSearchParams(search)
    for (const name of ['metres', 'side', 'across', 'hand', ...Object.keys(change)]) next.delete(name)
    for (const [name, value] of Object.entries(change)) if (value !== null) next.set(name, value)
    return `?${next}`
  }
  const metres = search.get('metres')
  const tapped: TypedPlace | null =
    metres === null
      ? null
      : {
          metres,
          side: search.get('side') === 'after' ? 'after' : 'before',
          across: search.get('across') ?? '0',
          hand: search.get('hand') === 'right' ? 'right' : 'left',
        }
  return { open: { mark: search.get('mark'), add: search.has('add'), tapped }, linkWith }
}

function OpenForm({
  page,
  open,
  closeTo,
  lastResult,
}: {
  page: CornerPageData
  open: OpenState
  closeTo: string
  lastResult: SubmissionResult<string[]> | null
}) {
  const mark = page.cut.corner.marks.find((one) => one.id === open.mark)
  if (open.add && page.may.add)
    return <AddMarkForm key={JSON.stringify(open.tapped)} {...{ page, closeTo, lastResult }} tapped={open.tapped} />
  if (!mark) return null
  const grounds: readonly Ground[] = page.show === 'both' ? GROUNDS.toReversed() : [page.show]
  return (
    <div className="mark-forms">
      {grounds.map((ground) => (
        <ChangeMarkForm
          key={`${mark.id} ${ground} ${JSON.stringify(mark[ground]?.stored)}`}
          {...{ page, closeTo, lastResult, mark, ground }}
          mayDrop={ground === grounds[0]}
        />
      ))}
    </div>
  )
}

function PreviousNext({ page }: { page: CornerPageData }) {
  const { previous, next, tabs } = page.cut
  const nameOf = (number: string) => tabs.find((tab) => tab.number === number)?.name
  return (
    <nav className="previous-next" aria-label={labels.around}>
      <Link className="btn" to={`../${previous}`} relative="path" rel="prev">
        <Icon name="left" /> {previous} {nameOf(previous)}
      </Link>
      <Link className="btn" to={`../${next}`} relative="path" rel="next">
        {next} {nameOf(next)} <Icon name="right" />
      </Link>
    </nav>
  )
}
