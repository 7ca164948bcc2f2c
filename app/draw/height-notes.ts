import type { HeightProfile } from '~/track/heights'
import type { LayoutFrame } from '~/track/layout-frame'
import { type Metres, metres, type Station, station } from '~/track/units'

/** What is worth saying of a lap's heights; `at` and `height` are where it is said. */
export type HeightNote = { at: Station; height: Metres } & (
  | { code: 'crest'; corner: string | null }
  | { code: 'up'; metres: Metres }
  | { code: 'down'; metres: Metres; corner: string }
  | { code: 'lowest' }
)

interface NotedCorner {
  name: string
  apex: Station
}

/** A corner nearer to the highest point than this gives it its name. */
const AT_THE_CREST = 60
/** A lap that rises less than this has nothing to tell, metres. */
const FLAT = 8

/**
 * The highest point, the climb to it and the fall from it, the lowest point. Climb and fall are told from and to the
 * nearest corner that has half of the lap's difference in height behind it.
 */
export function lapNotes(profile: HeightProfile, corners: readonly NotedCorner[], frame: LayoutFrame): HeightNote[] {
  const { highest, lowest } = profile
  const span = highest.height - lowest.height
  const heightAt = (at: Station) => profile.samples[Math.round(at / profile.step) % profile.samples.length]!.height
  const nearest = [...corners].sort(
    (a, b) => Math.abs(frame.gap(highest.station, a.apex)) - Math.abs(frame.gap(highest.station, b.apex)),
  )[0]
  const named = nearest && Math.abs(frame.gap(highest.station, nearest.apex)) <= AT_THE_CREST ? nearest.name : null
  const notes: HeightNote[] = [
    { code: 'crest', at: highest.station, height: highest.height, corner: named },
    { code: 'lowest', at: lowest.station, height: lowest.height },
  ]
  if (span < FLAT) return notes
  const steep = (ahead: (corner: NotedCorner) => number) =>
    [...corners]
      .sort((a, b) => ahead(a) - ahead(b))
      .find(({ apex }) => highest.height - (heightAt(apex) ?? highest.height) >= span / 2)
  const foot = steep(({ apex }) => frame.ahead(apex, highest.station))
  const end = steep(({ apex }) => frame.ahead(highest.station, apex))
  const between = (from: Station, to: Station) => station((from + frame.ahead(from, to) / 2) % frame.length)
  if (foot) {
    const at = between(foot.apex, highest.station)
    const rise = highest.height - heightAt(foot.apex)!
    notes.push({ code: 'up', at, height: heightAt(at) ?? highest.height, metres: metres(rise) })
  }
  if (end) {
    const at = between(highest.station, end.apex)
    const fall = highest.height - heightAt(end.apex)!
    notes.push({ code: 'down', at, height: heightAt(at) ?? highest.height, metres: metres(fall), corner: end.name })
  }
  return notes
}
