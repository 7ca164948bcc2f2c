import { SaxesParser } from 'saxes'
import { count, type Problem, problem } from '~/track/read/problems'

/** Deepest nesting of elements, and most attributes of one element. */
const deepest = 64
const mostAttributes = 64
/** Most elements, and most prefixes that are declared. */
const mostElements = 2_000_000
const mostPrefixes = 100
/** Longest run of text before the first element: a declaration and a comment. */
const longestProlog = 64 * 1024
/** Bytes given to the parser at a time: a refusal stops the walk within one of them. */
const chunkBytes = 32 * 1024

/** What an element is told about: names are without their prefix. */
export interface XmlReader {
  /** Returns 'skip' to leave out the element and all in it. */
  open(name: string, attributes: Readonly<Record<string, string>>): 'skip' | undefined
  /** Text, in pieces as it comes, of the innermost element that is not skipped. */
  text(text: string): void
  close(name: string): void
}

/** Where the walk stands, for the readers: `stop` ends it with a problem. */
export interface XmlPlace {
  where(): string
  stop(found: Problem): void
}

/**
 * Streams an XML document through a reader chosen by its root element. Elements count by their local name; those whose
 * prefix is bound to a namespace that is not one of `namespaces` (nor the root's own) are left out with all in them. A
 * prefix that is bound to nothing is taken as if it were not there. A document type declaration, broken XML, nesting
 * deeper than 64, more than 64 attributes in one element, more than 2,000,000 elements or 100 prefixes end the walk.
 */
export function walkXml(
  body: Uint8Array,
  decoder: TextDecoder,
  namespaces: readonly string[],
  readerFor: (root: string, place: XmlPlace) => XmlReader | Problem,
): Problem | undefined {
  const walk = new Walk(new Set(namespaces), readerFor)
  for (let at = 0; at < body.length && !walk.found; at += chunkBytes) {
    walk.write(decoder.decode(body.subarray(at, at + chunkBytes), { stream: true }))
  }
  if (!walk.found) walk.write(decoder.decode())
  if (!walk.found) walk.end()
  return walk.found
}

class Walk {
  found: Problem | undefined
  private readonly parser = new SaxesParser()
  private reader: XmlReader | undefined
  private depth = 0
  private attributes = 0
  private elements = 0
  private prolog = 0
  private hasDoctype = false
  /** Whether the element at hand declares a namespace. */
  private declares = false
  /** Local names of the open elements. */
  private readonly path: string[] = []
  /** Depth at which a left-out element stands; Infinity where none is open. */
  private skippedFrom = Number.POSITIVE_INFINITY
  /** Namespace bindings in force: undone as their element closes. */
  private readonly bound = new Map<string, string>()
  private readonly prefixes = new Set<string>()
  private readonly undo: { depth: number; prefix: string; uri: string | undefined }[] = []

  constructor(
    private readonly namespaces: Set<string>,
    private readonly readerFor: (root: string, place: XmlPlace) => XmlReader | Problem,
  ) {
    // Seven handlers at most: with an eighth V8 keeps the parser's properties in a dictionary, and it runs four times slower.
    this.parser.on('error', (error) => this.stop(brokenXml(error.message, this.where())))
    this.parser.on('doctype', () => this.stop(doctypeProblem(this.where())))
    this.parser.on('attribute', ({ name }) => {
      if (name.startsWith('xmlns')) this.declares = true
      if (++this.attributes > mostAttributes) {
        this.stop(
          problem('xml-broken', `An element has more than ${mostAttributes} attributes. Save it again.`, this.where()),
        )
      }
    })
    this.parser.on('opentag', (tag) => {
      this.open(tag.name, tag.attributes as Record<string, string>)
      this.attributes = 0
      this.declares = false
    })
    this.parser.on('closetag', () => this.close())
    const text = (part: string) => {
      if (!this.found && this.depth < this.skippedFrom) this.reader?.text(part)
    }
    this.parser.on('text', text)
    this.parser.on('cdata', text)
  }

  where = () => `line ${this.parser.line}`

  stop = (found: Problem) => {
    this.found ??= found
  }

  write(text: string): void {
    this.parser.write(text)
    if (this.elements > 0 || this.found) return
    // The parser tells of a document type declaration only at its end, which may be far.
    this.hasDoctype ||= text.includes('<!DOCTYPE')
    this.prolog += text.length
    if (this.prolog <= longestProlog) return
    this.stop(this.hasDoctype ? doctypeProblem(this.where()) : brokenXml('no element begins in it', this.where()))
  }

  end(): void {
    this.parser.close()
    if (!this.reader) this.stop(brokenXml('', this.where()))
  }

  private open(name: string, attributes: Record<string, string>): void {
    if (this.found) return
    if (++this.depth > deepest) {
      const says = `The elements are nested more than ${deepest} deep. Save the line alone.`
      this.stop(problem('xml-too-deep', says, this.where()))
      return
    }
    if (++this.elements > mostElements) {
      const says = `The file holds more than ${count(mostElements)} elements. Save one lap, or the line alone.`
      this.stop(problem('xml-too-many-elements', says, this.where()))
      return
    }
    const [prefix, local] = splitName(name)
    this.path.push(local)
    if (this.depth >= this.skippedFrom) return
    if (this.declares) this.bind(attributes)
    if (!this.reader) {
      this.begin(prefix, local)
      return
    }
    const uri = this.bound.get(prefix)
    const foreign = uri !== undefined && !this.namespaces.has(uri)
    if (foreign || this.reader.open(local, attributes) === 'skip') this.skippedFrom = this.depth
  }

  /** The root: its own namespace, known or not, is the document's. */
  private begin(prefix: string, local: string): void {
    const home = this.bound.get(prefix)
    const reader = this.readerFor(local, { where: this.where, stop: this.stop })
    if ('code' in reader) {
      this.stop(reader)
      return
    }
    this.reader = reader
    if (home !== undefined) this.namespaces.add(home)
  }

  private bind(attributes: Record<string, string>): void {
    for (const key in attributes) {
      if (key !== 'xmlns' && !key.startsWith('xmlns:')) continue
      const prefix = key === 'xmlns' ? '' : key.slice(6)
      this.undo.push({ depth: this.depth, prefix, uri: this.bound.get(prefix) })
      this.bound.set(prefix, attributes[key]!)
      this.prefixes.add(prefix)
    }
    if (this.prefixes.size > mostPrefixes) {
      const says = `The file declares more than ${mostPrefixes} prefixes. Save the line alone.`
      this.stop(problem('xml-broken', says, this.where()))
    }
  }

  private close(): void {
    if (this.found) return
    const local = this.path.pop()!
    if (this.depth < this.skippedFrom) this.reader?.close(local)
    else if (this.depth === this.skippedFrom) this.skippedFrom = Number.POSITIVE_INFINITY
    for (let last = this.undo.at(-1); last?.depth === this.depth; last = this.undo.at(-1)) {
      this.undo.pop()
      if (last.uri === undefined) this.bound.delete(last.prefix)
      else this.bound.set(last.prefix, last.uri)
    }
    this.depth--
  }
}

function splitName(name: string): [prefix: string, local: string] {
  const colon = name.indexOf(':')
  return colon === -1 ? ['', name] : [name.slice(0, colon), name.slice(colon + 1)]
}

function doctypeProblem(where: string): Problem {
  const says = 'The file carries a document type declaration, which is not read. Take the line with <!DOCTYPE out.'
  return problem('xml-doctype', says, where)
}

function brokenXml(detail: string, where: string): Problem {
  // The parser's messages begin with "line:column: ".
  const what = detail
    .replace(/^\d+:\d+:\s*/, '')
    .replace(/\.$/, '')
    .slice(0, 120)
  const says =
    what === '' || /unclosed|unexpected end/i.test(what)
      ? 'The file ends in the middle. Save it again from where it came.'
      : `The XML is broken: ${what}. Save the file again from where it came.`
  return problem('xml-broken', says, where)
}
