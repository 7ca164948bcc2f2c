/** The frame around a book's pages. */
export const bookFrameWords = {
  book: 'Book',
  archived: 'archived',
  tabs: 'Corners',
  all: 'All',
  wholeCircuit: 'Whole circuit',
  toTeam: 'To the team’s page',
} as const
