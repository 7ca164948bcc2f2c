import { overviewOf } from '~/book/cuts'
import { conditionParam, lookAt } from '~/book/look'
import { may } from '~/book/may'
import { missingOf } from '~/book/missing'
import { changeLines } from '~/components/overview/change-lines'
import type { OverviewData } from '~/components/overview/overview-data'
import { OverviewPage } from '~/components/overview/overview-page'
import { readChanges } from '~/db/read-changes.server'
import { readNames } from '~/db/read-team.server'
import { bookContext } from '~/middleware/book.server'
import { dbContext } from '~/middleware/context'
import { layOutGeometry } from '~/middleware/lay-out-geometry.server'
import { allow } from '~/middleware/refusal.server'
import { sheetWidth } from '~/middleware/sheet-width.server'
import { teamContext } from '~/middleware/team.server'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/overview'

export const meta: Route.MetaFunction = ({ loaderData }) =>
  loaderData ? [{ title: pageTitle(loaderData.overview.book.name) }] : []

/** Lines of the log that are looked through, and how many of them the page tells. */
const LOOKED_THROUGH = 60
const TOLD = 6

export async function loader({ request, url, context }: Route.LoaderArgs): Promise<OverviewData> {
  const view = context.get(bookContext)
  const { actor, team } = context.get(teamContext)
  allow(actor, 'book.read')
  const db = context.get(dbContext)
  const asked = url.searchParams.get('condition')
  const { condition } = lookAt(view.conditions, { condition: asked, show: null })
  const [ofBook, ofLayout, names] = await Promise.all([
    readChanges(db, actor, { book: view.book.id, limit: LOOKED_THROUGH }),
    readChanges(db, actor, { layout: view.layout.id, limit: LOOKED_THROUGH }),
    readNames(db, actor),
    layOutGeometry(context, actor, view.layout),
  ])
  const logs = [ofBook, ofLayout].map((changes) => ({ changes, goesOn: changes.length === LOOKED_THROUGH }))
  const chosen = view.conditions.find((one) => one.id === condition)
  const search = chosen && chosen.kind !== 'dry' ? `?condition=${conditionParam(view.conditions, chosen)}` : ''
  return {
    team: team.slug,
    overview: overviewOf(view, condition),
    conditions: view.conditions,
    condition,
    search,
    missing: missingOf(view, condition),
    changes: changeLines(logs, view, names, TOLD),
    may: { addMarks: may(actor, 'mark.add', { archived: view.book.archived }).ok },
    sheet: sheetWidth(request),
  }
}

export default function Overview({ loaderData }: Route.ComponentProps) {
  return <OverviewPage page={loaderData} />
}
