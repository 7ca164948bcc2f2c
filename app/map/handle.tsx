import L from 'leaflet'
import { type ReactNode, useEffect, useLayoutEffect, useRef, useState } from 'react'
import { createPortal } from 'react-dom'
import { useMap } from 'react-leaflet'
import type { LngLat } from '~/track/units'
import { toLatLng, toLngLat } from './to-leaflet'

interface HandleProps {
  at: LngLat
  /** What a screen reader says of it. */
  label: string
  selected?: boolean
  movable: boolean
  /** Higher lies on top. */
  layer: number
  className: string
  children: ReactNode
  onSelect?: (() => void) | undefined
  onDrag?: ((to: LngLat) => void) | undefined
  onDrop?: ((to: LngLat) => void) | undefined
  /** Steps of an arrow key: `forward` along the road (up), `left` across it. */
  onNudge?: ((steps: { forward: number; left: number }) => void) | undefined
}

const STEPS: Record<string, readonly [forward: number, left: number]> = {
  ArrowUp: [1, 0],
  ArrowDown: [-1, 0],
  ArrowLeft: [0, 1],
  ArrowRight: [0, -1],
}
/** Metres of one press with Shift held. */
const FAR = 10

/** Something on the map that can be pointed at, focused, dragged and pushed by arrow keys. */
export function Handle(props: HandleProps) {
  const { at, label, selected = false, movable, layer, className, children } = props
  const map = useMap()
  const latest = useRef(props)
  const [handle] = useState(() => makeHandle(at, className))
  useLayoutEffect(() => {
    latest.current = props
  })
  useLayoutEffect(() => {
    handle.marker.addTo(map)
    return () => {
      handle.marker.remove()
    }
  }, [handle, map])
  useLayoutEffect(() => {
    if (!handle.dragging) handle.marker.setLatLng(toLatLng(at))
  }, [handle, at])
  useLayoutEffect(() => {
    handle.marker.setZIndexOffset(layer)
    if (movable) handle.marker.dragging?.enable()
    else handle.marker.dragging?.disable()
  }, [handle, layer, movable])
  useLayoutEffect(() => {
    const element = handle.marker.getElement()
    element?.setAttribute('aria-label', label)
    element?.setAttribute('aria-pressed', String(selected))
  }, [handle, label, selected])
  useEffect(() => listen(handle, latest), [handle])
  return createPortal(children, handle.content)
}

interface Live {
  marker: L.Marker
  content: HTMLElement
  dragging: boolean
}

function makeHandle(at: LngLat, className: string): Live {
  const content = document.createElement('span')
  // The size is the style sheet's: larger under a finger.
  const icon = new L.DivIcon({ html: content, className: `map-handle ${className}`, iconSize: undefined })
  return { content, dragging: false, marker: new L.Marker(toLatLng(at), { icon, keyboard: true, draggable: true }) }
}

/** Passes what happens to the handle on to the props of the last render. */
function listen(handle: Live, latest: { readonly current: HandleProps }): () => void {
  const { marker } = handle
  const key = (event: KeyboardEvent) => {
    const { onSelect, onNudge, movable } = latest.current
    const step = STEPS[event.key]
    if (step && movable && onNudge) {
      const size = event.shiftKey ? FAR : 1
      onNudge({ forward: step[0] * size, left: step[1] * size })
    } else if (onSelect && (event.key === 'Enter' || event.key === ' ')) onSelect()
    else return
    // The map would pan, the page would scroll.
    event.preventDefault()
    event.stopPropagation()
  }
  marker.on({
    click: () => latest.current.onSelect?.(),
    dragstart: () => {
      handle.dragging = true
    },
    drag: () => latest.current.onDrag?.(toLngLat(marker.getLatLng())),
    dragend: () => {
      handle.dragging = false
      latest.current.onDrop?.(toLngLat(marker.getLatLng()))
    },
  })
  const element = marker.getElement()
  element?.addEventListener('keydown', key)
  return () => {
    marker.off()
    element?.removeEventListener('keydown', key)
  }
}
