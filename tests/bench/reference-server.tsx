import { PassThrough } from 'node:stream'
import { createRequestHandler } from '@react-router/express'
import { createReadableStreamFromReadable } from '@react-router/node'
import compression from 'compression'
import express from 'express'
import type { ReactNode } from 'react'
import { renderToPipeableStream } from 'react-dom/server'
import {
  type EntryContext,
  Links,
  Meta,
  Outlet,
  RouterContextProvider,
  Scripts,
  ScrollRestoration,
  type ServerBuild,
  ServerRouter,
  useLoaderData,
} from 'react-router'

/**
 * A page of the framework with nothing on it but plain SVG nodes: what the pages of the app are weighed against. The same
 * request handler, renderer and compression as the app's; no database, no session, no loader. Runs as a process of its own,
 * tells its parent the port, and draws as many nodes as the address says: `/?nodes=400`.
 */

function Layout({ children }: { children: ReactNode }) {
  return (
    <html lang="en-GB">
      <head>
        <meta charSet="utf-8" />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  )
}

function Nodes() {
  const count = useLoaderData<typeof nodesLoader>()
  return (
    <svg viewBox="0 0 956 656" aria-hidden="true">
      {Array.from({ length: count }, (_, i) => `M${i} 0L${i} 656`).map((d) => (
        <path key={d} className="node" d={d} strokeWidth={2} />
      ))}
    </svg>
  )
}

const nodesLoader = ({ request }: { request: Request }) => Number(new URL(request.url).searchParams.get('nodes'))

function handleDocument(request: Request, status: number, headers: Headers, context: EntryContext) {
  headers.set('Content-Type', 'text/html; charset=utf-8')
  return new Promise<Response>((resolve, reject) => {
    const { pipe } = renderToPipeableStream(<ServerRouter context={context} url={request.url} />, {
      onShellReady() {
        const body = new PassThrough()
        resolve(new Response(createReadableStreamFromReadable(body), { status, headers }))
        pipe(body)
      },
      onShellError: reject,
    })
  })
}

const plain = {
  hasAction: false,
  hasLoader: false,
  hasClientAction: false,
  hasClientLoader: false,
  hasClientMiddleware: false,
  hasErrorBoundary: false,
  imports: [],
  css: [],
  clientActionModule: undefined,
  clientLoaderModule: undefined,
  clientMiddlewareModule: undefined,
  hydrateFallbackModule: undefined,
}

const build: ServerBuild = {
  entry: { module: { default: handleDocument } },
  routes: {
    root: { id: 'root', path: '', module: { Layout, default: Outlet } as never },
    nodes: { id: 'nodes', parentId: 'root', index: true, module: { loader: nodesLoader, default: Nodes } as never },
  },
  assets: {
    entry: { module: '/entry.js', imports: [] },
    routes: {
      root: { ...plain, id: 'root', path: '', module: '/root.js' },
      nodes: { ...plain, id: 'nodes', parentId: 'root', index: true, hasLoader: true, module: '/nodes.js' },
    },
    url: '/manifest.js',
    version: '1',
  },
  publicPath: '/',
  assetsBuildDirectory: '',
  future: { v8_passThroughRequests: true, v8_trailingSlashAwareDataRequests: true, v8_middleware: true },
  ssr: true,
  isSpaMode: false,
  prerender: [],
  routeDiscovery: { mode: 'initial', manifestPath: '/__manifest' },
}

const app = express()
app.use(compression())
app.use(createRequestHandler({ build, getLoadContext: () => new RouterContextProvider() }))
const server = app.listen(0, '127.0.0.1', () => {
  const address = server.address()
  if (typeof address === 'object' && address) process.send?.(address.port)
})
process.on('disconnect', () => process.exit())
