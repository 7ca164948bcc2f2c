import type { ShouldRevalidateFunctionArgs } from 'react-router'

/** Whether a navigation only changes what is open on a page: same path, nothing sent, and these parameters as they were. */
export function opensOnly(
  { currentUrl, nextUrl, formMethod }: ShouldRevalidateFunctionArgs,
  kept: readonly string[] = [],
) {
  if (formMethod && formMethod !== 'GET') return false
  if (currentUrl.pathname !== nextUrl.pathname || currentUrl.search === nextUrl.search) return false
  return kept.every((name) => currentUrl.searchParams.get(name) === nextUrl.searchParams.get(name))
}

/** Whether something was sent: then everything is read again, after a refusal or a conflict too, since others changed it. */
export const isSent = ({ formMethod }: ShouldRevalidateFunctionArgs) => formMethod !== undefined && formMethod !== 'GET'

/** For frames around pages: what they show does not hang on the address's query. */
export const frameRevalidates = (args: ShouldRevalidateFunctionArgs) =>
  isSent(args) || (!opensOnly(args) && args.defaultShouldRevalidate)
