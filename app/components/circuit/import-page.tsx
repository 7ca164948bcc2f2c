import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { type ReactNode, useMemo } from 'react'
import { Form, useSubmit } from 'react-router'
import { FormErrors } from '~/components/form/form-errors'
import { Button } from '~/components/ui/button'
import { Facts } from '~/components/ui/facts'
import { Caution, ErrorNotice } from '~/components/ui/notice'
import { roadOf } from '~/draw/road'
import { makeCentreline } from '~/track/centreline'
import type { DraftCorner } from '~/track/layout-draft'
import { makeFrame } from '~/track/layout-frame'
import type { Lap, Piece, Remedy } from '~/track/read-layout'
import type { Along, Position } from '~/track/units'
import { importWords as words } from '~/words/import'
import { CircuitFields } from './circuit-fields'
import { CircuitSheet } from './circuit-sheet'
import { CornerPicks } from './corner-picks'
import type { ImportFields } from './import-schema'
import { lapFacts } from './lap-facts'
import { AnchorChoice, AnchorFields, LapChoice, PieceChoice } from './reading-choices'
import { StartFields } from './start-fields'

/** A circuit file on its way in, as its page is given it. */
export interface ImportPageData {
  /** Changes whenever the form is to begin anew from `fields`. */
  version: string
  fields: ImportFields
  laps: readonly Lap[]
  lapTaken: number | null
  pieces: readonly Piece[]
  /** What stands in the way, each with a remedy where there is one; none where the file was read. */
  problems: readonly { message: string; remedy: Remedy | null }[]
  warnings: readonly string[]
  read: { positions: readonly Position[]; startAlong: Along; reversed: boolean; corners: readonly DraftCorner[] } | null
  /** The file is in metres, and was given its place on the globe. */
  anchored: boolean
  zones: readonly string[]
  /** Width in px that the server draws for. */
  sheet: number
}

interface ImportPageProps {
  page: ImportPageData
  lastResult: SubmissionResult<string[]> | null | undefined
}

const FORM = 'import'

/** One form: whatever step is taken, what was typed for the others goes along. */
export function ImportPage({ page, lastResult }: ImportPageProps) {
  const [form, fields] = useForm<ImportFields>({ id: FORM, lastResult, defaultValue: page.fields })
  const { read, laps, lapTaken, pieces } = page
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      {/* Enter in a field keeps what is typed; it takes no step. */}
      <button type="submit" name="intent" value="keep" className="hidden" tabIndex={-1} aria-hidden="true" />
      <FormErrors form={form} />
      {page.problems.map(({ message, remedy }) => (
        <ErrorNotice key={message} title={words.notRead}>
          <p>{message}</p>
          {remedy === 'close' && (
            <Button className="mt-2" name="intent" value="close">
              {words.close}
            </Button>
          )}
        </ErrorNotice>
      ))}
      {page.problems.some(({ remedy }) => remedy === 'give-anchor') && <AnchorFields fields={fields} />}
      {read ? (
        <ReadLayout page={page} read={read} fields={fields} />
      ) : (
        <>
          <ReadingChoices {...{ laps, lapTaken, pieces, fields }} />
          <div>
            <GiveUp />
          </div>
        </>
      )}
    </Form>
  )
}

type Fields = ReturnType<typeof useForm<ImportFields>>[1]

function ReadLayout({
  page,
  read,
  fields,
}: {
  page: ImportPageData
  read: NonNullable<ImportPageData['read']>
  fields: Fields
}) {
  const { positions, startAlong, reversed, corners } = read
  const submit = useSubmit()
  const moveStart = (to: Along) => {
    const form = document.getElementById(FORM)
    if (!(form instanceof HTMLFormElement)) return
    const sent = new FormData(form)
    sent.set('intent', 'start-at')
    sent.set('startAlong', String(to))
    submit(sent, { method: 'post', preventScrollReset: true })
  }
  const road = useMemo(
    () => roadOf(makeFrame(makeCentreline(positions), { startAlong, reversed }), 12),
    [positions, startAlong, reversed],
  )
  const named = useMemo(() => corners.map((corner) => ({ ...corner, id: corner.key, name: '' })), [corners])
  return (
    <div className="grid gap-x-9 gap-y-7 min-[1000px]:grid-cols-[minmax(0,1fr)_420px]">
      <div className="grid content-start gap-5">
        <CircuitSheet
          road={road}
          title={page.fields.name || words.title}
          corners={named}
          width={page.sheet}
          onStartMove={moveStart}
        />
        <Part title={words.asRead}>
          <Facts facts={lapFacts(road, corners.length)} />
          <ReadingChoices laps={page.laps} lapTaken={page.lapTaken} pieces={page.pieces} fields={fields} />
          {page.anchored && <AnchorChoice fields={fields} />}
        </Part>
        <Warnings warnings={page.warnings} />
      </div>
      <Settings page={page} corners={corners} named={named} fields={fields} />
    </div>
  )
}

interface SettingsProps {
  page: ImportPageData
  corners: readonly DraftCorner[]
  named: readonly { key: string; number: string; name: string }[]
  fields: Fields
}

/** What a person settles of a line that was read: how it is driven, its corners, what it is called. */
function Settings({ page, corners, named, fields }: SettingsProps) {
  return (
    <div className="grid content-start gap-7">
      <Part title={words.way}>
        <StartFields fields={fields} corners={named} />
      </Part>
      <Part title={words.corners} lead={corners.length > 0 ? words.cornersLead : words.noCorners}>
        {corners.length > 0 && <CornerPicks field={fields.corners} corners={corners} />}
      </Part>
      <Part title={words.settings}>
        <CircuitFields fields={fields} zones={page.zones} />
      </Part>
      <div className="flex flex-wrap gap-2.5">
        <Button look="primary" size="large" name="intent" value="save">
          {words.save}
        </Button>
        <GiveUp />
      </div>
    </div>
  )
}

function Part({ title, lead, children }: { title: string; lead?: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="h2 pb-1.5">{title}</h2>
      {lead && <p className="pb-2 text-ink-muted">{lead}</p>}
      {children}
    </section>
  )
}

function GiveUp() {
  return (
    <Button look="quiet" name="intent" value="cancel">
      {words.cancel}
    </Button>
  )
}

function Warnings({ warnings }: { warnings: readonly string[] }) {
  if (warnings.length === 0) return null
  return (
    <Part title={words.warnings}>
      <ul className="border-t border-rule-strong">
        {warnings.map((warning) => (
          <Caution key={warning}>{warning}</Caution>
        ))}
      </ul>
    </Part>
  )
}

type ReadingProps = Pick<ImportPageData, 'laps' | 'lapTaken' | 'pieces'> & { fields: Fields }

function ReadingChoices({ laps, lapTaken, pieces, fields }: ReadingProps) {
  return (
    <>
      {laps.length > 1 && <LapChoice field={fields.lap} laps={laps} taken={lapTaken ?? 0} />}
      {pieces.length > 1 && <PieceChoice field={fields.pieces} pieces={pieces} />}
    </>
  )
}
