import { type ReactNode, Suspense, useMemo } from 'react'
import { Form, href, Link, useSubmit } from 'react-router'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { useCentreline, useGround } from '~/components/geometry/geometry-store'
import { ButtonLink } from '~/components/ui/button'
import { Facts } from '~/components/ui/facts'
import { readGround } from '~/draw/ground'
import { roadOf } from '~/draw/road'
import { makeFrame } from '~/track/layout-frame'
import type { Along } from '~/track/units'
import { circuitWords as words } from '~/words/circuits'
import { formatMetres } from '~/words/measures'
import { CircuitSheet } from './circuit-sheet'
import { CornerTable } from './corner-table'
import { lapFacts } from './lap-facts'
import type { LayoutActionData, LayoutChange, LayoutPageData } from './layout-data'
import { Outcome } from './layout-outcome'
import { WayForm } from './way-form'

/** A layout of a circuit: its road, its corners, its start line and direction. */
export function LayoutPage({ page, sent }: { page: LayoutPageData; sent: LayoutActionData | null }) {
  const { circuit, layout, corners, may } = page
  const at = { team: page.team, circuit: circuit.slug }
  /** A form that is sent again begins with what the answer gives back; after a change of anyone's it begins anew. */
  const keyOf = (form: LayoutActionData['form']) => (sent?.form === form ? `${layout.rev} ${sent.id}` : layout.rev)
  const lastOf = (form: LayoutActionData['form']) => (sent?.form === form ? sent.lastResult : null)
  return (
    <PageBody>
      <PageHead title={circuit.name} lead={layout.name}>
        {may.makeBook && (
          <ButtonLink
            look={page.books.length === 0 ? 'go' : 'plain'}
            to={`${href('/teams/:team/books/new', at)}?${new URLSearchParams({ layout: layout.id })}`}
          >
            {words.makeBook}
          </ButtonLink>
        )}
      </PageHead>
      {sent?.outcome && (
        <div className="pb-5">
          <Outcome outcome={sent.outcome} here={href('/teams/:team/circuits/:circuit', at)} />
        </div>
      )}
      <Suspense fallback={<div className="min-h-96" />}>
        <Road page={page}>
          <Part title={words.corners}>
            <CornerTable
              key={keyOf('corners')}
              corners={corners}
              lastResult={lastOf('corners')}
              mayChange={may.change}
            />
          </Part>
          {may.change && (
            <Part title={words.start}>
              <WayForm key={keyOf('way')} layout={layout} corners={corners} lastResult={lastOf('way')} />
            </Part>
          )}
          {page.changes.length > 0 && (
            <Part title={words.changes}>
              <Changes changes={page.changes} mayUndo={may.change} />
            </Part>
          )}
        </Road>
      </Suspense>
    </PageBody>
  )
}

/** The drawing with the facts read off it, beside what is changed of it. */
function Road({ page, children }: { page: LayoutPageData; children: ReactNode }) {
  const { circuit, layout, corners, team } = page
  const centreline = useCentreline(team, layout.centreline)
  const collection = useGround(team, layout.ground)
  const { startAlong, reversed, roadWidth } = layout
  const road = useMemo(
    () => roadOf(makeFrame(centreline, { startAlong, reversed }), roadWidth),
    [centreline, startAlong, reversed, roadWidth],
  )
  const submit = useSubmit()
  const moveStart = (to: Along) =>
    submit(
      { intent: 'start-at', seenStart: String(startAlong), startAlong: String(to) },
      { method: 'post', preventScrollReset: true },
    )
  const ground = useMemo(() => readGround(collection, centreline.plane), [collection, centreline])
  return (
    <div className="grid gap-x-9 gap-y-7 min-[1000px]:grid-cols-[minmax(0,1fr)_420px]">
      <div className="grid content-start gap-5">
        <CircuitSheet
          road={road}
          title={circuit.name}
          corners={corners}
          ground={ground}
          width={page.sheet}
          onStartMove={page.may.change ? moveStart : undefined}
        />
        <Facts
          facts={[
            ...lapFacts(road, corners.length),
            [words.facts.roadWidth, formatMetres(roadWidth, 1)],
            [words.facts.timeZone, circuit.timeZone],
          ]}
        />
        <Books page={page} />
      </div>
      <div className="grid content-start gap-7">{children}</div>
    </div>
  )
}

function Books({ page: { team, books } }: { page: LayoutPageData }) {
  if (books.length === 0) return null
  return (
    <Part title={words.facts.books}>
      <ul className="border-t border-rule-strong">
        {books.map(({ slug, name }) => (
          <li key={slug} className="border-b border-rule">
            <Link
              className="flex min-h-9 items-center underline max-[799px]:min-h-12"
              to={href('/teams/:team/books/:book', { team, book: slug })}
            >
              {name}
            </Link>
          </li>
        ))}
      </ul>
    </Part>
  )
}

function Changes({ changes, mayUndo }: { changes: readonly LayoutChange[]; mayUndo: boolean }) {
  return (
    <ul className="border-t border-rule-strong">
      {changes.map(({ operation, words: said, who, when }) => (
        <li key={operation} className="flex min-h-9 items-center gap-3 border-b border-rule max-[799px]:min-h-12">
          <span className="min-w-0 flex-1 wrap-anywhere">{said}</span>
          <span className="sm muted whitespace-nowrap">
            {who} {when}
          </span>
          {mayUndo && (
            <Form method="post" preventScrollReset>
              <input type="hidden" name="operation" value={operation} />
              <button className="btn btn-quiet btn-small" type="submit" name="intent" value="undo">
                {words.undo}
              </button>
            </Form>
          )}
        </li>
      ))}
    </ul>
  )
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="h2 pb-1.5">{title}</h2>
      {children}
    </section>
  )
}
