import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { deepest, JsonCursor, jsonSizeProblem, mostContainers } from '~/track/read/json'

/** Builds the value that a cursor walks over. */
function build(json: JsonCursor): unknown {
  if (json.isString()) return json.string()
  if (json.isNumber()) return json.number()
  if (json.isArray()) {
    const values: unknown[] = []
    json.elements(() => values.push(build(json)))
    return values
  }
  if (json.isObject()) {
    const members: [string, unknown][] = []
    json.members((key) => members.push([key, build(json)]))
    return Object.fromEntries(members)
  }
  json.skip()
  return 'word'
}

const isJson = (text: string) => {
  try {
    JSON.parse(text)
    return true
  } catch {
    return false
  }
}

const walks = (text: string) => {
  const json = new JsonCursor(text)
  json.skip()
  json.end()
  return json.fault === undefined
}

describe('Walking over JSON', () => {
  it('gives the values that JSON.parse gives', () => {
    const noWords = fc
      .jsonValue()
      .map((value) => JSON.parse(JSON.stringify(value, (_, v) => (typeof v === 'boolean' || v === null ? 'word' : v))))
    fc.assert(
      fc.property(noWords, fc.constantFrom(undefined, 1, '\t'), (value, indent) => {
        const json = new JsonCursor(JSON.stringify(value, null, indent))
        expect(build(json)).toEqual(value)
        json.end()
        expect(json.fault).toBeUndefined()
      }),
    )
  })

  it('takes and refuses the texts that JSON.parse takes and refuses', () => {
    const sign = fc.constantFrom(
      ...'{}[]",:0123456789.-+eE \n\\utrfalsn'.split(''),
      '\\u00e9',
      'true',
      'null',
      '"a"',
      '1.5',
    )
    fc.assert(
      fc.property(
        fc.array(sign, { maxLength: 9 }).map((signs) => signs.join('')),
        (text) => walks(text) === isJson(text),
      ),
      { numRuns: 5000 },
    )
    fc.assert(
      fc.property(fc.json(), fc.nat(), fc.string({ maxLength: 2 }), (text, at, put) => {
        const changed = text.slice(0, at % (text.length + 1)) + put + text.slice((at % (text.length + 1)) + 1)
        return walks(changed) === isJson(changed)
      }),
      { numRuns: 2000 },
    )
  })

  it.each([
    ['{"a":1', 'json-broken', 'line 1, character 7', /ends in the middle/],
    ['{\n"a" 1}', 'json-broken', 'line 2, character 5', /colon is missing/],
    ['[NaN]', 'not-a-number', 'line 1, character 2', /“NaN”/],
    ['[-Infinity]', 'not-a-number', 'line 1, character 3', /“-Infinity”/],
    ['[0x25]', 'not-a-number', 'line 1, character 3', /“0x25”/],
    ['[1]]', 'json-broken', 'line 1, character 4', /follows the end/],
  ])('%j stops it with the place', (text, code, where, says) => {
    const json = new JsonCursor(text)
    json.skip()
    json.end()
    expect(json.fault).toMatchObject({ code, where, message: expect.stringMatching(says) })
  })
})

describe('The size of a JSON text', () => {
  it(`more than ${mostContainers} lists and objects are refused, brackets in texts not counted`, () => {
    const most = `[${'{},'.repeat(mostContainers - 2)}"[[[{{{\\"[["]`
    expect(jsonSizeProblem(most)).toBeUndefined()
    expect(jsonSizeProblem(`[${most},[]]`)).toMatchObject({ code: 'json-too-many-containers' })
  })

  it(`nesting deeper than ${deepest} is refused`, () => {
    expect(jsonSizeProblem('['.repeat(deepest) + ']'.repeat(deepest))).toBeUndefined()
    expect(jsonSizeProblem('{"a":'.repeat(deepest + 1))).toMatchObject({
      code: 'json-too-deep',
      where: 'line 1, character 321',
    })
  })
})
