/** What a page says instead of itself: a heading and one sentence. */
export type Failure = { title: string; text: string }

const failures: Record<number, Failure> = {
  400: { title: 'That address makes no sense', text: 'Part of it is missing or misspelt. Go back and follow a link.' },
  403: {
    title: 'Not yours to change',
    text: 'Your role in this team does not reach this far. The manager can say more.',
  },
  404: { title: 'No such page', text: 'It was moved, or it belongs to a team you are not in.' },
  405: { title: 'Not that way', text: 'This page can be read, not written to.' },
  413: { title: 'Too large', text: 'More was sent than this page takes. Nothing of it was kept.' },
  429: { title: 'Too many tries', text: 'Wait a few minutes, then try again.' },
  503: {
    title: 'The book is closed for a moment',
    text: 'The server does not reach its database. Try again in a minute.',
  },
}

const unknown: Failure = {
  title: 'Something broke on our side',
  text: 'What you had stored is untouched. Try again; if it happens twice, tell the manager the time it happened.',
}

/** Heading and sentence for a page that ends with this HTTP status. */
export const failureWords = (status: number): Failure => failures[status] ?? unknown
