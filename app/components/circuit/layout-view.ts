import type { OperationId, PersonId } from '~/book/ids'
import type { FieldChange, TargetKind } from '~/book/operation'
import type { CornerRow } from '~/book/rows'
import type { LayoutFrame } from '~/track/layout-frame'
import { along, type Degrees, degrees, type Metres } from '~/track/units'
import { type LayoutChangeKind, layoutChangeWords } from '~/words/circuits'
import { whenWords } from '~/words/dates'
import type { LayoutChange, LayoutCorner } from './layout-data'

/** Corners of the drawn line as the layout drives them, in driving order. */
export function drivenCorners(rows: readonly CornerRow[], frame: LayoutFrame): LayoutCorner[] {
  const { reversed } = frame
  return rows
    .map((row) => {
      const opposite = row.direction === 'left' ? 'right' : 'left'
      return {
        id: row.id,
        number: row.number,
        name: row.name,
        direction: reversed ? (opposite as LayoutCorner['direction']) : row.direction,
        turnDegrees: degrees(row.turnDegrees) as Degrees,
        leastRadius: row.leastRadius as Metres,
        entry: frame.toStation(along(reversed ? row.exit : row.entry)),
        apex: frame.toStation(along(row.apex)),
      }
    })
    .sort((a, b) => a.apex - b.apex)
}

interface Logged {
  operation: OperationId
  target: { kind: TargetKind; id: string }
  set: Record<string, FieldChange>
  by: PersonId | null
  madeAt: string
}

const MOST = 6

/** The latest changes of a layout worth telling: names, numbers, start line and direction, not the bringing in itself. */
export function layoutChanges(
  changes: readonly Logged[],
  corners: readonly LayoutCorner[],
  names: ReadonlyMap<PersonId, string>,
  clock: { now: string; timeZone: string },
): LayoutChange[] {
  const numbers = new Map(corners.map(({ id, number }) => [id, number]))
  return changes
    .flatMap(({ operation, target, set, by, madeAt }) => {
      const kind = kindOf(target.kind, set)
      if (!kind) return []
      const said = layoutChangeWords(kind, numbers.get(target.id) ?? null, set)
      const who = by && (names.get(by)?.split(' ')[0] ?? null)
      return [{ operation, words: said, who, when: whenWords(madeAt, clock.now, clock.timeZone) }]
    })
    .slice(0, MOST)
}

function kindOf(target: TargetKind, set: Record<string, FieldChange>): LayoutChangeKind | null {
  if (set.state) return null
  if (target === 'corner' && (set.name || set.number)) return 'corner'
  if (target !== 'layout') return null
  return set.reversed ? 'direction' : set.startAlong ? 'start' : null
}
