import { lazy, useMemo } from 'react'
import { circuitMap } from '~/draw/circuit-map'
import type { CircuitMapProps } from '~/map/circuit-map'
import { LiveOverStill } from './live-over-still'

const Live = lazy(async () => ({ default: (await import('~/map/circuit-map')).CircuitMap }))

interface CircuitMapFrameProps extends Omit<CircuitMapProps, 'onReady'> {
  description?: string | undefined
}

/**
 * A layout on a map to move on, its start line to take hold of; until the map stands, and without JavaScript, its still
 * picture. Fills the positioned element around it, which has the projection's size.
 */
export function CircuitMap({ description, ...live }: CircuitMapFrameProps) {
  const { scene, projection, words, reader } = live
  const still = useMemo(() => circuitMap(scene, projection, words, reader), [scene, projection, words, reader])
  return (
    <LiveOverStill still={still} label={words.label} description={description}>
      {(onReady) => <Live {...live} onReady={onReady} />}
    </LiveOverStill>
  )
}
