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

/** For frames around pages: what they show does not hang on the address's query. */
export const frameRevalidates = (args: ShouldRevalidateFunctionArgs) => !opensOnly(args) && args.defaultShouldRevalidate
