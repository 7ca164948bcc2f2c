import type { z } from 'zod'
import type { CircuitId, CornerId, LayoutId } from '~/book/ids'
import { drivenBack, type ImportChoices, type ImportTyped, readAnew, startAt, startMoved } from '~/track/import-choices'
import { asDrawn, type LayoutDraft } from '~/track/layout-draft'
import { along, metres, station } from '~/track/units'
import { importWords as words } from '~/words/import'
import type { CornerRow, SavedImport, stepSchemas } from './import-schema'

type Payload = Record<string, unknown>
const text = (value: unknown): string => (typeof value === 'string' ? value.slice(0, 200) : '')

/** What was typed, from the fields as they came. A corner whose number is its place in the lap has none of its own. */
export function typedIn(payload: Payload, draft: LayoutDraft): ImportTyped {
  const rows = Array.isArray(payload.corners) ? (payload.corners as Payload[]) : []
  const places = new Map(draft.ok ? draft.corners.map(({ key, number }) => [key, number]) : [])
  return {
    name: text(payload.name),
    layout: text(payload.layout),
    timeZone: text(payload.timeZone),
    roadWidth: text(payload.roadWidth),
    corners: Object.fromEntries(
      rows.map((row) => {
        const number = text(row.number)
        const own = number === places.get(text(row.key)) ? '' : number
        return [text(row.key), { accepted: row.accept === 'on', number: own, name: text(row.name) }]
      }),
    ),
  }
}

type Schemas = ReturnType<typeof stepSchemas>
export type StepValue = { [Step in keyof Schemas]: { step: Step; value: z.output<Schemas[Step]> } }[keyof Schemas]

/** The choices after a step other than saving or giving up. */
export function afterStep(choices: ImportChoices, draft: LayoutDraft, { step, value }: StepValue): ImportChoices {
  switch (step) {
    case 'lap':
      return readAnew(choices, { lap: value.lap })
    case 'pieces':
      return readAnew(choices, { pieces: value.pieces })
    case 'anchor':
      return readAnew(choices, { anchor: [value.longitude, value.latitude] })
    case 'close':
      return readAnew(choices, { close: true })
    case 'reverse':
      return drivenBack(choices)
    case 'start': {
      if (!draft.ok) return choices
      const from = draft.corners.find(({ key }) => key === value.startFrom)?.entry ?? station(0)
      const ahead = value.startWay === 'back' ? -value.startMetres : value.startMetres
      return startMoved(choices, draft.frame, from, metres(ahead))
    }
    case 'start-at':
      return draft.ok ? startAt(choices, along(value.startAlong % draft.frame.length)) : choices
    default:
      return choices
  }
}

interface Ids {
  circuit: CircuitId
  layout: LayoutId
  corner: () => CornerId
}

/** The circuit to bring in: the drawn line, how it is driven, and the corners that are kept. */
export function circuitOf(
  saved: SavedImport,
  draft: Extract<LayoutDraft, { ok: true }>,
  choices: ImportChoices,
  ids: Ids,
) {
  const rows = new Map<string, CornerRow>(saved.corners.map((row) => [row.key, row]))
  const { frame, reading, corners } = draft
  return {
    circuit: { id: ids.circuit, name: saved.name, timeZone: saved.timeZone },
    layout: {
      id: ids.layout,
      name: saved.layout,
      startAlong: choices.startAlong,
      reversed: choices.reversed,
      roadWidth: saved.roadWidth,
    },
    positions: reading.layout.positions,
    ground: null,
    corners: corners.flatMap((corner) => {
      const row = rows.get(corner.key)
      if (!row?.accept) return []
      const number = row.number || corner.number
      const drawn = asDrawn(corner, frame)
      return {
        id: ids.corner(),
        number,
        name: row.name || words.turnName(number),
        ...drawn,
        datum: { along: drawn.apex, words: words.datum },
      }
    }),
  }
}
