import type { ImportChoices } from '~/track/import-choices'
import { type LayoutDraft, widthOf } from '~/track/layout-draft'
import type { Position } from '~/track/units'
import { importWords as words } from '~/words/import'
import { formatNumber } from '~/words/measures'
import type { ImportPageData } from './import-page'
import type { ImportFields } from './import-schema'

/** Degrees to seven places, about a centimetre: what a drawing needs. */
const rounded = ([lon, lat, height]: Position): Position =>
  height === undefined ? [degree(lon), degree(lat)] : [degree(lon), degree(lat), Math.round(height * 100) / 100]
const degree = (value: number) => Math.round(value * 1e7) / 1e7

/** What the page of a circuit on its way in is given. */
export function pageOf(draft: LayoutDraft, choices: ImportChoices, sheet: number): ImportPageData {
  const { reading } = draft
  const { startAlong, reversed } = choices
  return {
    version: JSON.stringify({ ...choices, typed: null }),
    fields: fieldsOf(draft, choices),
    laps: reading.laps ?? [],
    lapTaken: reading.lapTaken ?? null,
    pieces: reading.pieces ?? [],
    problems: reading.ok ? [] : reading.problems.map(({ message, remedy }) => ({ message, remedy: remedy ?? null })),
    warnings: reading.ok ? reading.warnings.map(({ message }) => message) : [],
    read: draft.ok
      ? { positions: draft.reading.layout.positions.map(rounded), startAlong, reversed, corners: draft.corners }
      : null,
    anchored: choices.anchor !== null,
    zones: Intl.supportedValuesOf('timeZone'),
    sheet,
  }
}

/** The form's fields: what was typed, else what the file says. */
function fieldsOf(draft: LayoutDraft, { typed, anchor }: ImportChoices): ImportFields {
  const layout = draft.ok ? draft.reading.layout : null
  const width = layout && widthOf(layout)
  return {
    name: typed.name || (layout?.name ?? ''),
    layout: typed.layout || words.layoutDefault,
    timeZone: typed.timeZone,
    roadWidth: typed.roadWidth || (width === null ? '' : formatNumber(width, 1)),
    corners: draft.ok
      ? draft.corners.map(({ key, number }) => {
          const own = typed.corners[key]
          return { key, accept: own?.accepted ?? true, number: own?.number || number, name: own?.name ?? '' }
        })
      : [],
    lap: '',
    pieces: [],
    longitude: anchor ? String(anchor[0]) : '',
    latitude: anchor ? String(anchor[1]) : '',
    startMetres: '',
    startWay: 'back',
    startFrom: '',
  }
}
