import encodeSans from '@fontsource-variable/encode-sans/files/encode-sans-latin-wdth-normal.woff2?url'
import type { ReactNode } from 'react'
import { Links, Meta, Outlet, Scripts, ScrollRestoration } from 'react-router'
import '~/app.css'
import { ProblemPage } from '~/components/frame/problem-page'
import { useNonce } from '~/components/nonce'
import { noStore } from '~/middleware/no-store'
import { person } from '~/middleware/person.server'
import { routePattern } from '~/middleware/route-pattern'
import type { Route } from './+types/root'

export const links: Route.LinksFunction = () => [
  { rel: 'preload', href: encodeSans, as: 'font', type: 'font/woff2', crossOrigin: 'anonymous' },
  { rel: 'icon', href: '/favicon.svg', type: 'image/svg+xml' },
]

export const middleware: Route.MiddlewareFunction[] = [routePattern, noStore, person]

export function Layout({ children }: { children: ReactNode }) {
  const nonce = useNonce()
  return (
    <html lang="en-GB" data-theme="system">
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta property="csp-nonce" nonce={nonce} />
        <Meta />
        <Links nonce="" />
      </head>
      <body>
        {children}
        <ScrollRestoration nonce={nonce} />
        <Scripts nonce={nonce} />
      </body>
    </html>
  )
}

export default function App() {
  return <Outlet />
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return (
    <div className="page-alone">
      <ProblemPage error={error} />
    </div>
  )
}
