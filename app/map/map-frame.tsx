import L from 'leaflet'
import { type ReactNode, useEffect, useMemo } from 'react'
import { MapContainer, useMap, useMapEvents } from 'react-leaflet'
import type { Projection } from '~/draw/projection'
import type { Plane } from '~/track/plane'
import type { LngLat } from '~/track/units'
import { planeCrs, planeToLatLng, toLngLat, zoomFor } from './to-leaflet'
import 'leaflet/dist/leaflet.css'
import './map.css'

/** Words of a map's own buttons and of the map itself. */
export interface MapFrameWords {
  label: string
  closer: string
  further: string
  /** Back to the first view. */
  whole: string
}

interface MapFrameProps {
  plane: Plane
  /** The first view, and the one to come back to. */
  home: Projection
  words: MapFrameWords
  onTap?: ((at: LngLat) => void) | undefined
  /** Called once the map stands. */
  onReady?: (() => void) | undefined
  children: ReactNode
}

/** px per metre that no map goes beyond, and how much further off than its first view it goes. */
const NEAREST = 40
const FURTHER_OFF = 8

/** A Leaflet map in the layout's own plane, at the place and scale of a still picture; it pans, zooms and takes taps. */
export function MapFrame({ plane, home, words, onTap, onReady, children }: MapFrameProps) {
  const crs = useMemo(() => planeCrs(plane), [plane])
  const zoom = (pxPerMetre: number) => zoomFor(crs, plane, home.middle, pxPerMetre)
  return (
    <MapContainer
      className="map-frame"
      crs={crs}
      center={planeToLatLng(plane, home.middle)}
      zoom={zoom(home.pxPerMetre)}
      minZoom={zoom(home.pxPerMetre / FURTHER_OFF)}
      maxZoom={zoom(NEAREST)}
      zoomSnap={0}
      zoomDelta={0.5}
      zoomControl={false}
      attributionControl={false}
      scrollWheelZoom={false}
    >
      <Behaviour label={words.label} onTap={onTap} onReady={onReady} />
      {children}
      <MapButtons plane={plane} home={home} words={words} />
    </MapContainer>
  )
}

/** Name, size, wheel and taps of the map around. The wheel zooms only while the map has the focus: a page scrolls over it. */
function Behaviour({ label, onTap, onReady }: Pick<MapFrameProps, 'onTap' | 'onReady'> & { label: string }) {
  const map = useMapEvents({ click: ({ latlng }) => onTap?.(toLngLat(latlng)) })
  useEffect(() => {
    const container = map.getContainer()
    container.setAttribute('role', 'group')
    container.setAttribute('aria-label', label)
    const observer = new ResizeObserver(() => map.invalidateSize({ pan: false }))
    observer.observe(container)
    const wheel = { on: () => map.scrollWheelZoom.enable(), off: () => map.scrollWheelZoom.disable() }
    container.addEventListener('focusin', wheel.on)
    container.addEventListener('focusout', wheel.off)
    return () => {
      observer.disconnect()
      container.removeEventListener('focusin', wheel.on)
      container.removeEventListener('focusout', wheel.off)
    }
  }, [map, label])
  useEffect(() => onReady?.(), [onReady])
  return null
}

function MapButtons({ plane, home, words }: Pick<MapFrameProps, 'plane' | 'home' | 'words'>) {
  const map = useMap()
  const back = () => {
    const zoom = zoomFor(map.options.crs!, plane, home.middle, home.pxPerMetre)
    map.setView(planeToLatLng(plane, home.middle), zoom)
  }
  return (
    <div className="map-buttons" ref={keepFromMap}>
      <MapButton label={words.closer} icon="M10 4v12M4 10h12" onPress={() => map.zoomIn()} />
      <MapButton label={words.further} icon="M4 10h12" onPress={() => map.zoomOut()} />
      <MapButton label={words.whole} icon="M4 8V4h4M16 8V4h-4M4 12v4h4M16 12v4h-4" onPress={back} />
    </div>
  )
}

/** A press on a button is no tap on the map under it. */
function keepFromMap(element: HTMLElement | null) {
  if (element) L.DomEvent.disableClickPropagation(element)
}

function MapButton({ label, icon, onPress }: { label: string; icon: string; onPress: () => void }) {
  return (
    <button type="button" aria-label={label} onClick={onPress}>
      <svg
        width="20"
        height="20"
        viewBox="0 0 20 20"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.6"
        aria-hidden="true"
      >
        <path d={icon} />
      </svg>
    </button>
  )
}
