import type { BrakeRole, MarkKind, TurnDirection } from '~/book/kinds'
import { glyphKind } from '~/draw/glyphs'
import { MarkGlyph } from '~/draw/svg/glyph'
import { overviewWords } from '~/words/overview'

/** One change as the overview tells it. */
export interface ChangeLine {
  /** The operation's id. */
  id: string
  corner: { number: string; name: string; direction: TurnDirection } | null
  mark: { kind: MarkKind; role: BrakeRole | null; gear: number | null } | null
  words: string
  /** First name of who made it; null for a job's. */
  who: string | null
}

/** What was changed in the book lately, the latest first. */
export function ChangeList({ changes }: { changes: readonly ChangeLine[] }) {
  if (changes.length === 0) return null
  return (
    <section className="side-part" aria-labelledby="changed-head">
      <h2 className="h2" id="changed-head">
        {overviewWords.changed}
      </h2>
      <ul className="change-list">
        {changes.map(({ id, corner, mark, words, who }) => (
          <li key={id}>
            <span className="change-glyph">
              {mark ? (
                <MarkGlyph
                  kind={glyphKind(mark.kind, mark.role)}
                  form="seen"
                  size={15}
                  gear={mark.gear}
                  mirror={corner?.direction === 'left'}
                />
              ) : null}
            </span>
            <span>
              {corner ? <b>{corner.name || corner.number}</b> : null}
              {corner ? ', ' : null}
              {words}
            </span>
            <span className="muted sm">{who}</span>
          </li>
        ))}
      </ul>
    </section>
  )
}
