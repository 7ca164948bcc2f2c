/** In place of a drawing whose geometry did not come. */
export const geometryWords = {
  failed: 'The map did not come. Everything else on this page stands.',
  again: 'Try again',
} as const
