/** Widths in px of the drawing on a page's left side: a common screen's, and a common phone's beside the thumb tabs. */
const DESK = 955
const PHONE = 342

/**
 * A guess at how wide the browser will show a drawing, so that its first picture has letters of the right size: a browser tells
 * whether it is a phone's by a client hint (Sec-CH-UA-Mobile) or by "Mobi" in its user agent.
 */
export function sheetWidth(request: Request): number {
  const hint = request.headers.get('sec-ch-ua-mobile')
  const phone = hint === null ? /\bMobi/.test(request.headers.get('user-agent') ?? '') : hint === '?1'
  return phone ? PHONE : DESK
}
