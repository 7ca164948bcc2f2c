import { index, layout, type RouteConfig, route } from '@react-router/dev/routes'

export default [
  index('routes/home.tsx'),
  route('health', 'routes/health.ts'),
  route('sign-in', 'routes/sign-in.tsx'),
  route('sign-out', 'routes/sign-out.ts'),
  route('teams', 'routes/teams.tsx'),
  route('teams/:team', 'routes/team/guard.tsx', [
    route('geometry/:hash', 'routes/team/geometry.ts'),
    route('books/:book', 'routes/book/layout.tsx', [
      index('routes/book/overview.tsx'),
      route('corners/:number', 'routes/book/corner.tsx'),
      route('operations', 'routes/book/operations.ts'),
      route('corners/:number.geojson', 'routes/book/corner-geojson.ts'),
    ]),
    layout('routes/team/layout.tsx', [
      index('routes/team/home.tsx'),
      route('books', 'routes/team/books.tsx'),
      route('books/new', 'routes/team/new-book.tsx'),
      route('circuits', 'routes/team/circuits.tsx'),
      route('circuits/import', 'routes/team/import.tsx'),
      route('circuits/import/:draft', 'routes/team/import-draft.tsx'),
      route('circuits/:circuit', 'routes/team/circuit.tsx'),
      route('cars', 'routes/team/cars.tsx'),
    ]),
  ]),
] satisfies RouteConfig
