import type { MiddlewareFunction } from 'react-router'
import { reportPatternContext } from '~/middleware/context'

/** Tells the log which route pattern answers. */
export const routePattern: MiddlewareFunction<Response> = ({ context, pattern }, next) => {
  context.get(reportPatternContext)(pattern)
  return next()
}
