/** Widths in px of the drawing on a page's left side: a common screen's, and a common phone's beside the thumb tabs. */
const DESK = 955
const PHONE = 342
const WHOLE_DESK = 1440
const WHOLE_PHONE = 390

/**
 * A guess at how wide the browser will show a drawing, so that its first picture has letters of the right size: a browser tells
 * whether it is a phone's by a client hint (Sec-CH-UA-Mobile) or by "Mobi" in its user agent.
 */
export const sheetWidth = (request: Request): number => (isPhone(request) ? PHONE : DESK)

/** The same guess for a drawing that goes from one edge of the page to the other. */
export const pageWidth = (request: Request): number => (isPhone(request) ? WHOLE_PHONE : WHOLE_DESK)

function isPhone(request: Request): boolean {
  const hint = request.headers.get('sec-ch-ua-mobile')
  return hint === null ? /\bMobi/.test(request.headers.get('user-agent') ?? '') : hint === '?1'
}
