import { type ReactNode, Suspense, useCallback, useState, useSyncExternalStore } from 'react'
import type { DisplayList } from '~/draw/display-list'
import { Drawing } from '~/draw/svg/drawing'

interface LiveOverStillProps {
  still: DisplayList
  label: string
  description?: string | undefined
  /** The map, given what to call once it stands. */
  children: (onReady: () => void) => ReactNode
}

const never = () => () => undefined

/** Whether the page has come alive: false on the server and while the server's page is taken over. */
const useAlive = () =>
  useSyncExternalStore(
    never,
    () => true,
    () => false,
  )

/** A still picture until the map in its place stands. */
export function LiveOverStill({ still, label, description, children }: LiveOverStillProps) {
  const alive = useAlive()
  const [stands, setStands] = useState(false)
  const onReady = useCallback(() => setStands(true), [])
  return (
    <>
      {stands ? null : <Drawing list={still} label={label} description={description} fluid={false} />}
      {alive ? <Suspense fallback={null}>{children(onReady)}</Suspense> : null}
    </>
  )
}
