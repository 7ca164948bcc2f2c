import { href } from 'react-router'
import { OutsideFrame } from '~/components/frame/outside-frame'
import { SignOutButton } from '~/components/frame/sign-out-button'
import { HomeCorner } from '~/components/home/home-corner'
import { SignInForm } from '~/components/sign-in/sign-in-form'
import { ButtonLink } from '~/components/ui/button'
import { personContext } from '~/middleware/person.server'
import { pageWidth } from '~/middleware/sheet-width.server'
import { homeWords } from '~/words/home'
import { signInWords } from '~/words/sign-in'
import type { Route } from './+types/home'

export const meta = () => [{ title: 'Turnstone' }, { name: 'description', content: homeWords.lead }]

export function loader({ request, context }: Route.LoaderArgs) {
  const person = context.get(personContext)
  return { person: person && { name: person.name }, sheet: pageWidth(request) }
}

export default function Home({ loaderData: { person, sheet } }: Route.ComponentProps) {
  return (
    <OutsideFrame right={person && <SignOutButton />}>
      <main className="flex flex-1 flex-col">
        <div className="grid gap-x-22 gap-y-7 px-4 pt-2 min-[800px]:px-14 min-[1000px]:grid-cols-[minmax(0,1fr)_330px]">
          <div>
            <h1 className="max-w-[860px] text-[43px] leading-[48px] font-[740] tracking-[-0.018em] text-balance font-stretch-[116%] max-[799px]:text-[30px] max-[799px]:leading-[35px]">
              {homeWords.title}
            </h1>
            <p className="lead mt-3.5 max-w-[760px]">{homeWords.lead}</p>
          </div>
          {person ? (
            <div className="h-fit rounded-lg border border-rule-strong bg-surface px-[18px] py-3.5">
              <p>{signInWords.goOn(person.name)}</p>
              <ButtonLink look="go" size="large" className="mt-3.5 w-full" to={href('/teams')}>
                {homeWords.toTeams}
              </ButtonLink>
            </div>
          ) : (
            <SignInForm />
          )}
        </div>
        <div className="mt-7">
          <HomeCorner sheet={sheet} />
        </div>
        <div className="mt-auto grid gap-x-12 gap-y-4 px-4 pt-7 pb-5 min-[800px]:grid-cols-3 min-[800px]:px-14">
          {homeWords.uses.map(({ when, what }) => (
            <p key={when} className="text-[15px] leading-[21px]">
              <b className="font-[680]">{when}</b> {what}
            </p>
          ))}
        </div>
      </main>
    </OutsideFrame>
  )
}
