import { href, isRouteErrorResponse, Link } from 'react-router'
import { frameWords } from '~/words/frame'
import { isProblem, type Problem, problem, problemOfStatus } from '~/words/problems'
import { pageTitle } from '~/words/titles'

/** The words for what a route threw: its own problem, that of its status, or that something broke. */
export function problemOf(error: unknown): Problem {
  if (!isRouteErrorResponse(error)) return problem('failed')
  return isProblem(error.data) ? error.data : problemOfStatus(error.status)
}

/** What a page says instead of itself, with one way on. */
export function ProblemPage({ error, to, label }: { error: unknown; to?: string; label?: string }) {
  const { title, text } = problemOf(error)
  return (
    <main className="w-full max-w-[640px] px-4 pt-7 pb-11 min-[800px]:px-14">
      <title>{pageTitle(title)}</title>
      <div className="problem">
        <h1 className="h2 text-danger">{title}</h1>
        <p className="mt-1">{text}</p>
        <p className="mt-4">
          <Link className="btn" to={to ?? href('/')}>
            {label ?? frameWords.firstPage}
          </Link>
        </p>
      </div>
    </main>
  )
}
