import { type Problem, problem } from '~/track/read/problems'

/** Largest file read: 20 MB, also as a computer that counts 1,024 × 1,024 bytes to the megabyte shows it. */
export const largestFile = 20 * 1024 * 1024

export type Format = 'geojson' | 'gpx' | 'kml' | 'csv'

/** What the first bytes show a file to be. */
type Family = 'json' | 'xml' | 'text'

export interface OpenedFile {
  readonly family: Family
  /** What the name promises; nothing where the extension says nothing. */
  readonly promised?: Format
  /** The bytes without a byte order mark. */
  readonly body: Uint8Array
  readonly decoder: TextDecoder
  readonly warnings: readonly Problem[]
}

const promises: ReadonlyMap<string, Format> = new Map([
  ['json', 'geojson'],
  ['geojson', 'geojson'],
  ['gpx', 'gpx'],
  ['kml', 'kml'],
  ['csv', 'csv'],
  ['tsv', 'csv'],
  ['txt', 'csv'],
])

/** What a family of content is called in a sentence. */
const familyWords: Readonly<Record<Family, string>> = { json: 'JSON', xml: 'XML', text: 'plain text' }
const familyOf: Readonly<Record<Format, Family>> = { geojson: 'json', gpx: 'xml', kml: 'xml', csv: 'text' }
export const formatWords: Readonly<Record<Format, string>> = { geojson: 'GeoJSON', gpx: 'GPX', kml: 'KML', csv: 'CSV' }

const unpack = 'Unpack it and bring the file inside.'
const signatures: readonly { readonly bytes: readonly number[]; readonly at?: number; readonly says: string }[] = [
  { bytes: [0x50, 0x4b, 0x03, 0x04], says: `This is a zip archive (a KMZ file is one). ${unpack}` },
  { bytes: [0x50, 0x4b, 0x05, 0x06], says: 'This is an empty zip archive. Save it again from where it came.' },
  { bytes: [0x1f, 0x8b], says: `This is a gzip archive. ${unpack}` },
  { bytes: [0x37, 0x7a, 0xbc, 0xaf], says: `This is a 7z archive. ${unpack}` },
  { bytes: [0x52, 0x61, 0x72, 0x21], says: `This is a rar archive. ${unpack}` },
  { bytes: [0x89, 0x50, 0x4e, 0x47], says: 'This is a PNG picture. A circuit comes as GeoJSON, GPX, KML or CSV.' },
  { bytes: [0xff, 0xd8, 0xff], says: 'This is a JPEG picture. A circuit comes as GeoJSON, GPX, KML or CSV.' },
  { bytes: [0x47, 0x49, 0x46, 0x38], says: 'This is a GIF picture. A circuit comes as GeoJSON, GPX, KML or CSV.' },
  { bytes: [0x25, 0x50, 0x44, 0x46], says: 'This is a PDF. A circuit comes as GeoJSON, GPX, KML or CSV.' },
  { bytes: [0x2e, 0x46, 0x49, 0x54], at: 8, says: 'This is a FIT recording. Save it as GPX and bring that.' },
]

/** The extension of a file's name in small letters, without the point. */
const extensionOf = (fileName: string) => /\.([^.\\/]{1,12})$/.exec(fileName)?.[1]?.toLowerCase() ?? ''

function markOf(bytes: Uint8Array): { label: string; length: number; words: string } | undefined {
  const [a, b, c] = bytes
  if (a === 0xef && b === 0xbb && c === 0xbf) return { label: 'utf-8', length: 3, words: 'UTF-8' }
  if (a === 0xff && b === 0xfe) return { label: 'utf-16le', length: 2, words: 'UTF-16' }
  if (a === 0xfe && b === 0xff) return { label: 'utf-16be', length: 2, words: 'UTF-16' }
  return undefined
}

/** The first letters of the content, past any white space. */
function firstLetters(body: Uint8Array, label: string): string {
  const wide = label !== 'utf-8'
  let at = 0
  while (at < body.length && body[at]! <= 32 && (wide || body[at] !== 0)) at++
  if (wide) at -= at % 2
  return new TextDecoder(label).decode(body.subarray(at, at + 512)).trimStart()
}

/** The encoding an XML declaration names, where a decoder for it exists. UTF-16 always has a byte order mark and is not looked for. */
function declaredDecoder(start: string): TextDecoder | Problem {
  const label = /^<\?xml[^>]*\sencoding\s*=\s*["']([A-Za-z0-9._:-]+)["']/.exec(start)?.[1] ?? 'utf-8'
  if (/^(utf-?16|ucs|iso-10646)/i.test(label)) return new TextDecoder('utf-8')
  try {
    return new TextDecoder(label)
  } catch {
    return problem(
      'unknown-encoding',
      `The file says it is written in ${label}, which is not known. Save it as UTF-8.`,
      'line 1',
    )
  }
}

function contentProblem(bytes: Uint8Array): Problem | undefined {
  if (bytes.length > largestFile) {
    const says = 'The file is larger than 20\u00A0MB. Save one lap, or the centreline alone, and bring that.'
    return problem('file-too-large', says)
  }
  for (const { bytes: signature, at = 0, says } of signatures) {
    if (signature.every((byte, i) => bytes[at + i] === byte)) return problem('not-the-format', says)
  }
  return undefined
}

/**
 * Takes the first look at a file: size, kind of content, byte order mark, encoding, and whether the content is what the
 * name's extension promises. Reads no further than the first bytes.
 */
export function openFile(bytes: Uint8Array, fileName: string): OpenedFile | Problem {
  const unfit = contentProblem(bytes)
  if (unfit) return unfit
  const mark = markOf(bytes)
  const body = mark ? bytes.subarray(mark.length) : bytes
  const label = mark?.label ?? 'utf-8'
  const start = firstLetters(body, label)
  if (start === '') return problem('file-empty', 'The file is empty. Save it again from where it came.')
  if (start.includes('\0')) {
    return problem('not-the-format', 'This is not a text file. A circuit comes as GeoJSON, GPX, KML or CSV.')
  }
  const family = familyOfContent(start)
  if (isWebPage(start)) {
    return problem('not-the-format', 'The file holds a web page. Save the circuit’s file itself and bring that.')
  }
  const promised = promises.get(extensionOf(fileName))
  if (promised && familyOf[promised] !== family) return mismatch(promised, family)
  const decoder = family === 'xml' && !mark ? declaredDecoder(start) : new TextDecoder(label)
  if (!(decoder instanceof TextDecoder)) return decoder
  const says = `The file begins with a ${mark?.words} byte order mark. It is left out.`
  const warnings = mark ? [problem('byte-order-mark', says)] : []
  return { family, ...(promised && { promised }), body, decoder, warnings }
}

const familyOfContent = (start: string): Family =>
  start[0] === '{' || start[0] === '[' ? 'json' : start[0] === '<' ? 'xml' : 'text'

const isWebPage = (start: string) => /^<(!doctype\s+html|html)\b/i.test(start)

/** The problem of a file whose name promises another format than it holds. */
function mismatch(promised: Format, found: Family): Problem {
  const says = `The name says ${formatWords[promised]}, but the file holds ${familyWords[found]}. Save it again from where it came, or give it the right ending.`
  return problem('not-the-format', says)
}
