import { count, type Problem, problem, quoted } from '~/track/read/problems'

/** Most objects and arrays a JSON file may hold. */
export const mostContainers = 600_000
/** Deepest nesting of objects and arrays. */
export const deepest = 64

const quote = 34
const backslash = 92
const openBracket = 91
const closeBracket = 93
const openBrace = 123
const closeBrace = 125
const comma = 44
const colon = 58
const minus = 45

/** Counts containers and depth in one pass over the text, strings skipped, before anything is built from it. */
export function jsonSizeProblem(text: string): Problem | undefined {
  let containers = 0
  let depth = 0
  let inString = false
  for (let i = 0; i < text.length; i++) {
    const c = text.charCodeAt(i)
    if (inString) {
      if (c === backslash) i++
      else if (c === quote) inString = false
    } else if (c === quote) inString = true
    else if (c === openBracket || c === openBrace) {
      if (++depth > deepest) {
        const says = `The lists are nested more than ${deepest} deep. A circuit needs six. Save the line alone.`
        return problem('json-too-deep', says, lineOf(text, i))
      }
      if (++containers > mostContainers) {
        const says = `The file holds more than ${count(mostContainers)} lists and objects. Save the circuit's line alone.`
        return problem('json-too-many-containers', says, lineOf(text, i))
      }
    } else if (c === closeBracket || c === closeBrace) depth--
  }
  return undefined
}

/** "line 3, character 14" of a place in a text. */
function lineOf(text: string, at: number): string {
  let line = 1
  let start = 0
  for (let i = text.indexOf('\n'); i !== -1 && i < at; i = text.indexOf('\n', i + 1)) {
    line++
    start = i + 1
  }
  return `line ${line}, character ${at - start + 1}`
}

/**
 * Walks a JSON text (RFC 8259) from front to back without building it. Each method takes the value at hand. At the first
 * fault the walk is over: `fault` is set, the cursor is at the end, and every method returns at once.
 * Depth must have been bounded before (`jsonSizeProblem`).
 */
export class JsonCursor {
  fault: Problem | undefined
  private at = 0

  constructor(private readonly text: string) {}

  /** Character code of the next value's first character; NaN at the end. */
  peek(): number {
    for (;;) {
      const c = this.text.charCodeAt(this.at)
      if (c !== 32 && c !== 10 && c !== 13 && c !== 9) return c
      this.at++
    }
  }

  /** Character code of what follows the bracket at hand, past white space. */
  peekInside(): number {
    const here = this.at
    this.peek()
    this.at++
    const inside = this.peek()
    this.at = here
    return inside
  }

  isArray = () => this.peek() === openBracket
  isObject = () => this.peek() === openBrace
  isString = () => this.peek() === quote
  isNumber = () => {
    const c = this.peek()
    return c === minus || (c >= 48 && c <= 57)
  }

  /** Takes an object; `each` must take the value of every member it is called for. */
  members(each: (key: string) => void): void {
    this.list(openBrace, closeBrace, () => {
      const key = this.string()
      if (this.peek() !== colon) {
        this.fail('A colon is missing after a name')
        return
      }
      this.at++
      each(key)
    })
  }

  /** Takes an array; `each` must take every value it is called for. */
  elements(each: () => void): void {
    this.list(openBracket, closeBracket, each)
  }

  private list(open: number, close: number, each: () => void): void {
    if (this.peek() !== open) {
      this.fail('A value is missing')
      return
    }
    this.at++
    if (this.peek() === close) {
      this.at++
      return
    }
    while (!this.fault) {
      each()
      const c = this.peek()
      if (c === comma) this.at++
      else if (c === close) {
        this.at++
        return
      } else this.fail('A comma or a closing bracket is missing')
    }
  }

  /** Takes a string. */
  string(): string {
    if (this.peek() !== quote) {
      this.fail('A name or text in quotation marks is missing')
      return ''
    }
    const start = this.at++
    let escaped = false
    for (;;) {
      const c = this.text.charCodeAt(this.at)
      if (c === quote) break
      if (!(c >= 32)) {
        this.fail('A text is not closed')
        return ''
      }
      if (c === backslash) {
        escaped = true
        if (!/^\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/.test(this.text.slice(this.at, this.at + 6))) {
          this.fail('A backslash stands before an unknown letter')
          return ''
        }
        this.at++
      }
      this.at++
    }
    this.at++
    const raw = this.text.slice(start, this.at)
    return escaped ? (JSON.parse(raw) as string) : raw.slice(1, -1)
  }

  /** Takes a number; it may be too large to hold, and is Infinity then. */
  number(): number {
    const start = this.at
    this.skipNumber()
    return this.fault ? Number.NaN : Number(this.text.slice(start, this.at))
  }

  private digits(): boolean {
    const start = this.at
    for (;;) {
      const c = this.text.charCodeAt(this.at)
      if (!(c >= 48 && c <= 57)) return this.at > start
      this.at++
    }
  }

  private skipNumber(): void {
    if (this.peek() === minus) this.at++
    const leadingZero = this.text.charCodeAt(this.at) === 48
    const start = this.at
    if (!this.digits()) {
      this.failNumber()
      return
    }
    if (leadingZero && this.at > start + 1) {
      this.failNumber()
      return
    }
    if (this.text.charCodeAt(this.at) === 46) {
      this.at++
      if (!this.digits()) {
        this.failNumber()
        return
      }
    }
    if ((this.text.charCodeAt(this.at) | 32) === 101) {
      this.at++
      const sign = this.text.charCodeAt(this.at)
      if (sign === 43 || sign === minus) this.at++
      if (!this.digits()) {
        this.failNumber()
        return
      }
    }
    const next = this.text.charCodeAt(this.at) | 32
    if (next >= 97 && next <= 122) this.failNumber()
  }

  /** Takes any value and forgets it. */
  skip(): void {
    const c = this.peek()
    if (c === openBrace) this.members(() => this.skip())
    else if (c === openBracket) this.elements(() => this.skip())
    else if (c === quote) this.string()
    else if (c === minus || (c >= 48 && c <= 57)) this.skipNumber()
    else this.word()
  }

  private word(): void {
    const word = /^[A-Za-z]*/.exec(this.text.slice(this.at, this.at + 9))![0]
    if (word === 'true' || word === 'false' || word === 'null') this.at += word.length
    else if (word === 'NaN' || word === 'Infinity') this.failNumber()
    else this.fail('A value is missing')
  }

  /** Holds that nothing but white space follows. */
  end(): void {
    if (!this.fault && !Number.isNaN(this.peek())) this.fail('Something follows the end of the JSON')
  }

  private failNumber(): void {
    const before = /[^\s,:[\]{}"]*$/.exec(this.text.slice(Math.max(0, this.at - 12), this.at))![0]
    const after = /^[^\s,:[\]{}"]*/.exec(this.text.slice(this.at, this.at + 12))![0]
    const says = `${quoted(before + after)} is not a decimal number as JSON writes it. Write it as digits with a point, such as 52.4071.`
    this.stop(problem('not-a-number', says, lineOf(this.text, this.at)))
  }

  private fail(what: string): void {
    if (this.fault) return
    const says =
      this.at >= this.text.length
        ? 'The file ends in the middle. Save it again from where it came.'
        : `The JSON is broken. ${what}. Save the file again from where it came.`
    this.stop(problem('json-broken', says, lineOf(this.text, Math.min(this.at, this.text.length))))
  }

  private stop(fault: Problem): void {
    this.fault ??= fault
    this.at = this.text.length
  }
}
