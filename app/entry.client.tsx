import { StrictMode, startTransition } from 'react'
import { hydrateRoot } from 'react-dom/client'
import { HydratedRouter } from 'react-router/dom'
import { makeBrowserStore } from '~/components/geometry/browser-store'
import { GeometryContext } from '~/components/geometry/geometry-store'

const geometry = makeBrowserStore()

startTransition(() => {
  hydrateRoot(
    document,
    <StrictMode>
      <GeometryContext value={geometry}>
        <HydratedRouter />
      </GeometryContext>
    </StrictMode>,
  )
})
