import { parseWithZod } from '@conform-to/zod/v4'
import { data, href, redirect } from 'react-router'
import { v7 } from 'uuid'
import type { CarId } from '~/book/ids'
import { may } from '~/book/may'
import { CarForm } from '~/components/car/car-form'
import { CarTable } from '~/components/car/car-table'
import { carSchema } from '~/components/car/schema'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { Empty } from '~/components/ui/empty'
import { addCar, changeCar, readCars } from '~/db/cars.server'
import { dbContext } from '~/middleware/context'
import { readForm } from '~/middleware/read-form.server'
import { allow, refusalOf } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { carWords as words } from '~/words/cars'
import { problem } from '~/words/problems'
import { teamWords } from '~/words/team'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/cars'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

export async function loader({ url, context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'car.read')
  const cars = await readCars(context.get(dbContext), actor)
  const mayChange = may(actor, 'car.change').ok
  const open = mayChange ? cars.find((car) => car.id === url.searchParams.get('car')) : undefined
  return { team: team.name, cars, open: open ?? null, mayChange, newId: v7() }
}

export async function action({ request, params, context }: Route.ActionArgs) {
  const { actor } = context.get(teamContext)
  allow(actor, 'car.change')
  const submission = parseWithZod(await readForm(request), { schema: carSchema })
  if (submission.status !== 'success') return data(submission.reply(), { status: problem('form').status })
  const db = context.get(dbContext)
  const car = { ...submission.value, id: submission.value.id as CarId }
  const known = (await readCars(db, actor)).some(({ id }) => id === car.id)
  const outcome = known ? await changeCar(db, actor, car) : await addCar(db, actor, car)
  if (outcome.kind !== 'made' && outcome.kind !== 'changed') throw refusalOf(outcome)
  return redirect(href('/teams/:team/cars', params))
}

export default function Cars({ loaderData, actionData, params }: Route.ComponentProps) {
  const { cars, open, mayChange, newId } = loaderData
  const listPath = href('/teams/:team/cars', params)
  return (
    <PageBody>
      <PageHead title={words.title} lead={words.lead} />
      <div className="grid gap-x-14 gap-y-7 min-[1000px]:grid-cols-[minmax(0,1fr)_330px]">
        <div>
          {cars.length === 0 ? (
            <Empty lead={words.none} question={words.noneQuestion} />
          ) : (
            <CarTable cars={cars} changePath={mayChange ? (car) => `${listPath}?car=${car}` : null} />
          )}
        </div>
        {mayChange ? (
          <CarForm key={open?.id ?? cars.length} newId={newId} car={open} lastResult={actionData} listPath={listPath} />
        ) : (
          <p className="muted">{teamWords.deskOnly}</p>
        )}
      </div>
    </PageBody>
  )
}
