import { parseWithZod } from '@conform-to/zod/v4'
import { data, href, redirect } from 'react-router'
import { v7 } from 'uuid'
import type { BookId, CarId, LayoutId } from '~/book/ids'
import { BookForm } from '~/components/book/book-form'
import { bookSchema } from '~/components/book/schema'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { makeBook } from '~/db/books.server'
import { readCars } from '~/db/cars.server'
import { readLayouts } from '~/db/read-circuits.server'
import { dbContext } from '~/middleware/context'
import { readForm } from '~/middleware/read-form.server'
import { allow, refusalOf } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { bookWords as words } from '~/words/books'
import { circuitWords } from '~/words/circuits'
import { problem } from '~/words/problems'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/new-book'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: pageTitle(words.newTitle, loaderData?.team ?? '') },
]

export async function loader({ url, context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'book.make')
  const db = context.get(dbContext)
  const [layouts, cars] = await Promise.all([readLayouts(db, actor), readCars(db, actor)])
  const asked = layouts.find(({ id }) => id === url.searchParams.get('layout')) ?? onlyOne(layouts)
  return {
    team: team.name,
    newId: v7(),
    layouts,
    cars: cars.map(({ id, name }) => ({ id: id as string, name })),
    chosen: { layout: asked?.id ?? '', car: onlyOne(cars)?.id ?? '' },
  }
}

const onlyOne = <Thing,>(things: readonly Thing[]): Thing | undefined => (things.length === 1 ? things[0] : undefined)

const GONE: Record<string, string> = { layout: words.layoutGone, car: words.carGone }

export async function action({ request, params, context }: Route.ActionArgs) {
  const { actor } = context.get(teamContext)
  allow(actor, 'book.make')
  const submission = parseWithZod(await readForm(request), { schema: bookSchema })
  const { status } = problem('form')
  if (submission.status !== 'success') return data(submission.reply(), { status })
  const db = context.get(dbContext)
  const layout = submission.value.layout as LayoutId
  const chosen = (await readLayouts(db, actor)).find(({ id }) => id === layout)
  const outcome = await makeBook(db, actor, {
    id: submission.value.id as BookId,
    layout,
    car: submission.value.car as CarId,
    name: submission.value.name ?? chosen?.circuit ?? '',
  })
  if (outcome.kind === 'invalid') {
    const fieldErrors = Object.fromEntries(
      outcome.problems.map(({ field }) => [field === 'name' ? 'layout' : field, [GONE[field] ?? words.layoutGone]]),
    )
    return data(submission.reply({ fieldErrors }), { status })
  }
  if (outcome.kind !== 'made') throw refusalOf(outcome)
  return redirect(href('/teams/:team/books/:book', { ...params, book: outcome.slug }))
}

export default function NewBook({ loaderData, actionData, params }: Route.ComponentProps) {
  const { newId, layouts, cars, chosen } = loaderData
  return (
    <PageBody width="form">
      <PageHead title={words.newTitle} lead={words.newLead} />
      {layouts.length === 0 ? (
        <Empty lead={words.needsCircuit} question={words.needsCircuitQuestion}>
          <ButtonLink to={href('/teams/:team/circuits/import', params)}>{circuitWords.bringIn}</ButtonLink>
        </Empty>
      ) : cars.length === 0 ? (
        <Empty lead={words.needsCar} question={words.needsCarQuestion}>
          <ButtonLink to={href('/teams/:team/cars', params)}>{words.addCar}</ButtonLink>
        </Empty>
      ) : (
        <BookForm
          newId={newId}
          layouts={layouts}
          cars={cars}
          chosen={chosen}
          lastResult={actionData}
          listPath={href('/teams/:team/books', params)}
        />
      )}
    </PageBody>
  )
}
