import { cornerGeoJson } from '~/book/corner-geojson'
import { cornerOf } from '~/book/cuts'
import { bookContext } from '~/middleware/book.server'
import { layOutGeometry } from '~/middleware/lay-out-geometry.server'
import { refusal } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import type { Route } from './+types/corner-geojson'

/** The corner's segment, landmarks and marks with both places, as RFC 7946 asks (media type: section 12). */
export async function loader({ context, params }: Route.LoaderArgs) {
  const view = context.get(bookContext)
  const cut = cornerOf(view, params.number)
  if (!cut) throw refusal('not-found')
  const frame = await layOutGeometry(context, context.get(teamContext).actor, view.layout)
  return new Response(JSON.stringify(cornerGeoJson(cut, frame)), {
    headers: {
      'Content-Type': 'application/geo+json',
      'Content-Disposition': `attachment; filename="${view.book.slug}-${cut.corner.number}.geojson"`,
    },
  })
}
