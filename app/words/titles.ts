/** The document's title: the page, then the wider places it is in, then the product. */
export const pageTitle = (...places: string[]): string => [...places, 'Turnstone'].join(' · ')
