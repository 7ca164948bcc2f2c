import { readdirSync, readFileSync } from 'node:fs'
import { expect, it } from 'vitest'
import { samples } from '../fixtures/circuits/make'

const folder = new URL('../fixtures/circuits/', import.meta.url)

it.each(Object.keys(samples))('the sample file %s is what its maker makes', (name) => {
  expect(readFileSync(new URL(name, folder), 'utf8')).toBe(samples[name]!())
})

it('every sample file has a maker', () => {
  const files = readdirSync(folder).filter((name) => !name.endsWith('.ts'))
  expect(files.toSorted()).toEqual(Object.keys(samples).toSorted())
})
