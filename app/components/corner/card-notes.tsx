import { Link } from 'react-router'
import type { CardView } from '~/book/view'
import { cornerLabels as labels } from '~/words/corner-labels'
import { downBy } from '~/words/kinds'
import { formatGear, formatSpeed } from '~/words/measures'
import type { CornerPageData } from './page-data'

/** What the card says of the corner in words. Fields that say nothing are left out. */
export function CardNotes({ page }: { page: CornerPageData }) {
  const { card } = page.cut.corner
  const setsUp = page.cut.tabs.find((tab) => tab.id === card.setsUp)
  const texts: [string, string][] = [
    [labels.terms.surface, card.surface],
    [labels.terms.water, card.water],
    [labels.terms.car, card.car],
    [labels.terms.mistake, card.mistake],
    [labels.terms.traffic, card.traffic],
    [labels.terms.limits, card.limits],
    [labels.terms.backup, card.backup],
    [labels.terms.next, card.next],
  ]
  const gears = gearWords(card)
  return (
    <section aria-label={labels.card}>
      <dl className="pairs card-notes">
        {gears ? (
          <>
            <dt>{labels.terms.gears}</dt>
            <dd>
              <b>{gears}</b>
            </dd>
          </>
        ) : null}
        {card.line ? <Text term={labels.terms.line} text={card.line} /> : null}
        {card.kerbs.length > 0 ? (
          <>
            <dt>{labels.terms.kerbs}</dt>
            <dd>
              {card.kerbs.map((kerb) => (
                <p key={kerb.part}>
                  <b>{kerb.part}</b> {kerb.words}
                </p>
              ))}
            </dd>
          </>
        ) : null}
        {texts.map(([term, text]) => (text ? <Text key={term} {...{ term, text }} /> : null))}
        {setsUp ? (
          <>
            <dt>{labels.terms.setsUp}</dt>
            <dd>
              <Link to={`../${setsUp.number}`} relative="path">
                {setsUp.number} {setsUp.name}
              </Link>
            </dd>
          </>
        ) : null}
      </dl>
    </section>
  )
}

function Text({ term, text }: { term: string; text: string }) {
  return (
    <>
      <dt>{term}</dt>
      <dd className={term === labels.terms.water ? 'water-words' : undefined}>{text}</dd>
    </>
  )
}

function gearWords(card: CardView): string {
  const speed = card.leastSpeed === null ? '' : `slowest ${formatSpeed(card.leastSpeed)}`
  if (card.flat) return card.gearIn === null ? 'Flat' : `Flat in ${formatGear(card.gearIn)}`
  if (card.gearIn === null || card.gearOut === null) return capital(speed)
  const down = card.gearIn - card.gearOut
  const gears =
    down > 0 ? `${formatGear(card.gearIn)} to ${formatGear(card.gearOut)}, ${downBy(down)}` : formatGear(card.gearOut)
  return speed ? `${gears}. ${capital(speed)}` : gears
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1)
