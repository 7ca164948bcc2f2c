import { Link } from 'react-router'
import type { MarkView, PlaceView } from '~/book/view'
import { Empty } from '~/components/ui/empty'
import { MarkGlyph } from '~/draw/svg/glyph'
import { type Metres, metres, type Seconds } from '~/track/units'
import { acrossWords, corner as words } from '~/words/corner'
import { cornerLabels as labels } from '~/words/corner-labels'
import { downBy, mannerWord, proofWord } from '~/words/kinds'
import { againstSimulator, formatKmhFigure, formatNumber } from '~/words/measures'
import { glyphForm, glyphKind, markName, shownProof } from './mark-words'
import type { CornerPageData, LineData } from './page-data'
import './mark-table.css'

interface MarkTableProps {
  page: CornerPageData
  selected: string | null
  /** Address of the page with this mark open. */
  linkTo: (mark: string) => string
}

/** The marks of a corner in road order with their distances: the twin of the map for the keyboard and for screen readers. */
export function MarkTable({ page, selected, linkTo }: MarkTableProps) {
  const marks = new Map<string, MarkView>(page.cut.corner.marks.map((mark) => [mark.id, mark]))
  return (
    <table className="ruled marks">
      <caption className="sr-only">{labels.table(page.cut.corner.name)}</caption>
      <thead>
        <tr>
          <th scope="col">{labels.columns.mark}</th>
          <th scope="col" className="r">
            {labels.columns.datum}
          </th>
          <th scope="col" className="r">
            {labels.columns.speed}
          </th>
          <th scope="col">{labels.columns.how}</th>
          <th scope="col">{labels.columns.tie}</th>
          <th scope="col">{labels.columns.across}</th>
          <th scope="col">{labels.columns.known}</th>
          <th scope="col">{labels.columns.against}</th>
          <th scope="col" className="r next">
            <span className="next-head">{labels.columns.next}</span>
            <span className="next-figures">
              <span>{labels.columns.metres}</span>
              <span>{labels.columns.lengths}</span>
              <span>{labels.columns.seconds}</span>
            </span>
          </th>
        </tr>
      </thead>
      <tbody>
        {page.lines.map((line) => {
          const mark = marks.get(line.mark)
          const place = mark?.[line.ground]
          return mark && place ? (
            <MarkRow key={mark.id} {...{ page, line, mark, place }} open={mark.id === selected} to={linkTo(mark.id)} />
          ) : null
        })}
      </tbody>
    </table>
  )
}

interface MarkRowProps {
  page: CornerPageData
  line: LineData
  mark: MarkView
  place: PlaceView
  open: boolean
  to: string
}

function MarkRow({ page, line, mark, place, open, to }: MarkRowProps) {
  const { corner, layout, car } = page.cut
  const form = glyphForm(line.ground, place, page.condition, page.me)
  return (
    <tr className={open ? 'open' : undefined} data-mark={mark.id}>
      <th scope="row">
        <Link to={to} preventScrollReset aria-current={open ? 'true' : undefined}>
          <MarkGlyph
            kind={glyphKind(mark)}
            form={form}
            size={line.ground === 'sim' ? 15 : 18}
            gear={mark.gear}
            mirror={corner.direction === 'left'}
          />
          {markName(mark)}
          {line.inherited ? <small> {labels.fromDry}</small> : null}
        </Link>
      </th>
      <td className="r datum">
        <ToDatum value={place.toDatum} />
      </td>
      <td className="r num" data-head="km/h">
        {mark.speed === null ? '' : formatKmhFigure(mark.speed)}
      </td>
      <td className="how">{how(mark)}</td>
      <td className="tie">{place.stored.tie?.words ?? ''}</td>
      <td className="across">
        {place.stored.tie?.acrossWords ?? acrossWords(place.offset, layout.roadWidth, car.width)}
      </td>
      <td className="known">
        <Known {...{ page, line, mark, place }} />
      </td>
      <td className="against">
        {line.againstSim === null ? null : (
          <span>
            <MarkGlyph
              kind={glyphKind(mark)}
              form="sim"
              size={15}
              gear={mark.gear}
              mirror={corner.direction === 'left'}
            />
            {againstSimulator(line.againstSim)}
          </span>
        )}
      </td>
      <td className="r next">{line.toNext ? <ToNext {...line.toNext} /> : null}</td>
    </tr>
  )
}

/** "133 before": the figure big, the word beside it. */
export function ToDatum({ value }: { value: Metres }) {
  const figure = formatNumber(value)
  return (
    <>
      <b className="num">{figure}</b>{' '}
      <span className="muted">
        {figure === '0' ? labels.atDatum : value < 0 ? labels.sides.before : labels.sides.after}
      </span>
    </>
  )
}

function how(mark: MarkView) {
  if (mark.kind === 'gear' && mark.downshifts !== null) return downBy(mark.downshifts)
  return mark.manner ? mannerWord(mark.manner) : ''
}

function Known({ page, line, mark, place }: Pick<MarkRowProps, 'page' | 'line' | 'mark' | 'place'>) {
  if (line.ground === 'sim') return <span className="muted">{mark.real ? labels.simPlace : labels.simOnly}</span>
  const proof = shownProof(place, page.condition, page.me)
  const state = proof?.proof ?? 'told'
  const by = proof && (page.names[proof.by] ?? labels.former).split(' ')[0]
  return (
    <span className={`proof proof-${state}`}>
      <i aria-hidden="true" /> {proofWord(state)} {by}
    </span>
  )
}

function ToNext({ metres: apart, lengths, seconds }: { metres: Metres; lengths: number; seconds: Seconds | null }) {
  return (
    <span className="next-figures num">
      <span>
        {formatNumber(apart)}
        <span className="unit"> {labels.columns.metres}</span>
      </span>
      <span>
        {formatNumber(metres(lengths), 1)}
        <span className="unit"> {labels.columns.lengths}</span>
      </span>
      <span>
        {seconds === null ? '' : formatNumber(seconds, 2)}
        <span className="unit">{seconds === null ? '' : ` ${labels.columns.seconds}`}</span>
      </span>
    </span>
  )
}

/** What stands where there is no mark to show. */
export function NoMarks({ page }: { page: CornerPageData }) {
  const { show } = page
  const none = page.cut.corner.marks.length === 0 || show === 'both'
  return none ? (
    <Empty lead={words.empty} question={words.emptyLead} />
  ) : (
    <Empty lead={words.emptyGround(show)} question={words.emptyGroundLead} />
  )
}
