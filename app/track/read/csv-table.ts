import { type Problem, problem } from '~/track/read/problems'

/** Most fields read of one row, and longest field in quotation marks. */
const mostFields = 256
const longestField = 10_000

const numberSign = 35
const quote = 34
const blank = 32

export interface Row {
  readonly fields: readonly string[]
  /** Line of the file on which the row begins, from 1. */
  readonly line: number
  /** The row as it stands in the file, without its line end. */
  readonly raw: string
}

/**
 * Walks the rows of a CSV text (RFC 4180): fields between `delimiter`, quotation marks doubled inside quoted fields, line
 * ends CRLF, LF or CR. Fields come trimmed. Blank lines are passed over. A quoted field of
 * more than 10,000 letters is taken for one that is never closed.
 */
export class CsvRows {
  problem: Problem | undefined
  private at = 0
  private line = 1
  private readonly lineEnd: string

  constructor(private readonly text: string) {
    this.lineEnd = text.includes('\n') || !text.includes('\r') ? '\n' : '\r'
  }

  /**
   * The next row that is not blank, or nothing at the end and at a quotation mark that is never closed.
   * @param withComments whether rows that begin with a number sign are given as well
   */
  next(delimiter: string, withComments = false): Row | undefined {
    while (this.at < this.text.length && !this.problem) {
      const line = this.line
      const start = this.at
      const raw = this.takeLine()
      if (raw.charCodeAt(0) === numberSign && !withComments) continue
      if (raw.trim() === '') continue
      if (!raw.includes('"')) return { fields: split(raw, delimiter), line, raw }
      this.at = start
      this.line = line
      const fields = this.takeQuoted(delimiter)
      if (fields) return { fields, line, raw }
    }
    return undefined
  }

  /** Reads a row again with another delimiter. */
  back(to: { at: number; line: number }): void {
    this.at = to.at
    this.line = to.line
  }

  place = () => ({ at: this.at, line: this.line })

  private takeLine(): string {
    const found = this.text.indexOf(this.lineEnd, this.at)
    const end = found === -1 ? this.text.length : found
    const start = this.at
    this.at = end + 1
    this.line++
    return this.text.slice(start, this.text[end - 1] === '\r' && end > start ? end - 1 : end)
  }

  private takeQuoted(delimiter: string): string[] | undefined {
    const fields: string[] = []
    const startLine = this.line
    for (;;) {
      while (this.text.charCodeAt(this.at) === blank) this.at++
      const isQuoted = this.text.charCodeAt(this.at) === quote
      const field = isQuoted ? this.takeQuotedField() : this.takePlainField(delimiter)
      if (field === undefined) {
        const says = 'A quotation mark opened in this row is never closed. Close it or take it out.'
        this.problem = problem('quote-open', says, `line ${startLine}`)
        return undefined
      }
      if (fields.length < mostFields) fields.push(field)
      if (isQuoted) this.takePlainField(delimiter)
      if (this.text[this.at] !== delimiter) break
      this.at++
    }
    this.at++
    this.line++
    return fields
  }

  private takePlainField(delimiter: string): string {
    const start = this.at
    const [stop, end] = [delimiter.charCodeAt(0), this.lineEnd.charCodeAt(0)]
    while (this.at < this.text.length) {
      const c = this.text.charCodeAt(this.at)
      if (c === stop || c === end) break
      this.at++
    }
    return this.text.slice(start, this.at).trim()
  }

  private takeQuotedField(): string | undefined {
    let value = ''
    let from = this.at + 1
    for (;;) {
      const mark = this.text.indexOf('"', from)
      if (mark === -1 || value.length + mark - from > longestField) return undefined
      const part = this.text.slice(from, mark)
      if (part.includes(this.lineEnd)) this.line += part.split(this.lineEnd).length - 1
      value += part
      if (this.text[mark + 1] !== '"') {
        this.at = mark + 1
        return value.trim()
      }
      value += '"'
      from = mark + 2
    }
  }
}

function split(raw: string, delimiter: string): string[] {
  const fields = raw.split(delimiter, mostFields)
  for (let i = 0; i < fields.length; i++) fields[i] = fields[i]!.trim()
  return fields
}
