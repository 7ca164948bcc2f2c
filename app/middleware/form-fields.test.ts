import { describe, expect, it } from 'vitest'
import { formFields, MOST_FIELDS, MOST_PLACES } from './form-fields'

function formOf(...fields: readonly (readonly [name: string, value: string])[]): FormData {
  const form = new FormData()
  for (const [name, value] of fields) form.append(name, value)
  return form
}
const named = (name: string) => formFields(formOf([name, 'a']))

describe('the fields of a form', () => {
  it('come through as they were sent, in their order and as often', () => {
    const sent = [
      ['name', 'Marram Head'],
      ['corners[0].number', '1'],
      ['corners[1].name', 'The Groyne'],
      ['pieces', '3'],
      ['pieces', '1'],
    ] as const
    expect([...(formFields(formOf(...sent)) ?? [])]).toEqual(sent)
  })

  it('come through with their file', () => {
    const form = new FormData()
    const file = new File(['lon,lat'], 'lap.csv')
    form.append('file', file)
    expect(formFields(form)?.get('file')).toBe(file)
  })

  it('lose control characters, and keep tabs and line ends', () => {
    const fields = formFields(formOf(['note', 'Turn\u0000 in\u000b\tat\r\nthe \u007fpost\u0085 – early']))
    expect(fields?.get('note')).toBe('Turn in\tat\r\nthe post – early')
  })

  it.each([
    '',
    '[0]',
    'email]',
    'email[]',
    'email[a]',
    'email[0',
    'email..a',
    'email.30000000',
    'email[-1]',
    'email[1.5]',
    'a b',
    'a\u0000',
    '__intent__',
    '__state__',
  ])('are refused where a name is “%s”', (name) => {
    expect(named(name)).toBeNull()
  })

  it.each([
    '__proto__',
    'constructor',
    'prototype.constructor',
    'toString',
    'a.__proto__.b',
    'a.constructor',
    'a[0].valueOf',
  ])('are refused where a name is that of something every object has: “%s”', (name) => {
    expect(named(name)).toBeNull()
  })

  it('are refused where a name is that of something every list has', () => {
    expect(named('length')).not.toBeNull()
    expect(named('a.length')).toBeNull()
    expect(named('a.map')).toBeNull()
  })

  it('are refused where a name is too deep or too long', () => {
    expect(named('a.b[1].c')).not.toBeNull()
    expect(named('a.b[1].c.d')).toBeNull()
    expect(named('b'.repeat(100))).not.toBeNull()
    expect(named('b'.repeat(101))).toBeNull()
  })

  it('are refused where they are too many', () => {
    const many = (count: number) => formOf(...Array.from({ length: count }, () => ['pieces', '7'] as const))
    expect(formFields(many(MOST_FIELDS))).not.toBeNull()
    expect(formFields(many(MOST_FIELDS + 1))).toBeNull()
  })

  it('are refused where their lists have too many places together, whatever was sent for them', () => {
    expect(named(`a[${MOST_PLACES - 1}]`)).not.toBeNull()
    expect(named(`a[${MOST_PLACES}]`)).toBeNull()
    expect(named('email[30000000]')).toBeNull()
    expect(formFields(formOf(['a[299]', 'x'], ['b[199]', 'y']))).not.toBeNull()
    expect(formFields(formOf(['a[299]', 'x'], ['b[200]', 'y']))).toBeNull()
    expect(formFields(formOf(['a[0].c[299]', 'x'], ['a[1].c[299]', 'y']))).toBeNull()
  })
})
