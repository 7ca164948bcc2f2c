import { type Problem, problem, quoted } from '~/track/read/problems'

/**
 * A decimal number: digits, sign, point, exponent and nothing else. NaN for anything besides (hexadecimal, "Infinity", a
 * comma, nothing at all) and for numbers too large to hold.
 */
export function decimal(text: string): number {
  for (let i = 0; i < text.length; i++) {
    const c = text.charCodeAt(i)
    const digit = c >= 48 && c <= 57
    if (!digit && c !== 45 && c !== 46 && c !== 43 && c !== 101 && c !== 69) return Number.NaN
  }
  const value = text.length === 0 ? Number.NaN : Number(text)
  return Number.isFinite(value) ? value : Number.NaN
}

const commaNumber = /^[+-]?\d+,\d+$/

/** Whether a text is a number written with a decimal comma: "37,7". */
export const hasDecimalComma = (text: string) => commaNumber.test(text)

/** A decimal number in which a comma may stand for the point. */
export function decimalWithComma(text: string): number {
  return hasDecimalComma(text) ? decimal(text.replace(',', '.')) : decimal(text)
}

const dateTime = /^\d{4}-\d\d-\d\d[T ]\d\d:\d\d:\d\d(?:[.,]\d{1,12})?(?:Z|[+-]\d\d:?\d\d)?$/

/** Seconds since 1970 of an xsd:dateTime; without a zone it is UTC (GPX 1.1). NaN where it is none. */
export function instant(text: string): number {
  if (text.length < 19 || !dateTime.test(text)) return Number.NaN
  const part = (from: number, to: number) => Number(text.slice(from, to))
  const [month, day, hour, minute] = [part(5, 7), part(8, 10), part(11, 13), part(14, 16)]
  if (month < 1 || month > 12 || day < 1 || day > 31 || hour > 24 || minute > 59) return Number.NaN
  let end = 19
  while (end < text.length && !'Z+-'.includes(text[end]!)) end++
  const fraction = Number(text.slice(17, end).replace(',', '.'))
  return Date.UTC(part(0, 4), month - 1, day, hour, minute) / 1000 + fraction - zoneSeconds(text.slice(end))
}

/** Seconds that a zone such as "+02:00" is ahead of UTC. */
function zoneSeconds(zone: string): number {
  if (zone === '' || zone === 'Z') return 0
  const digits = zone.replace(/\D/g, '')
  const ahead = Number(digits.slice(0, 2)) * 3600 + Number(digits.slice(2)) * 60
  return zone.startsWith('-') ? -ahead : ahead
}

/**
 * Whether a longitude and latitude are degrees on the globe.
 * @param openEast whether longitude 180 itself is out, as in GPX 1.1 (−180 ≤ lon < 180); GeoJSON and KML allow it
 */
export function coordinateFits(lon: number, lat: number, openEast = false): boolean {
  return lat >= -90 && lat <= 90 && lon >= -180 && (openEast ? lon < 180 : lon <= 180)
}

/** What is wrong with a longitude and latitude that do not fit. */
export function coordinateProblem(lon: number, lat: number, where: string, openEast = false): Problem {
  if (!Number.isFinite(lon) || !Number.isFinite(lat)) {
    return problem('not-a-number', 'A coordinate here is not a finite number. Correct it or take the point out.', where)
  }
  const latFits = lat >= -90 && lat <= 90
  if (!latFits && Math.abs(lat) <= 180 && Math.abs(lon) <= 90) {
    const says = `Longitude and latitude look swapped: ${lat} stands where a latitude belongs. Put the longitude first.`
    return problem(
      'swapped-axes',
      openEast ? says.replace('Put the longitude first', 'Exchange lat and lon') : says,
      where,
    )
  }
  if (Math.abs(lon) > 400 || Math.abs(lat) > 400) {
    const says = `${lon}, ${lat} are not degrees; they look like metres of a map grid. Save the file in WGS 84 longitude and latitude.`
    return problem('out-of-range', says, where)
  }
  const says = latFits
    ? `The longitude ${lon} is out of range: longitudes run from −180 ${openEast ? 'to just under 180' : 'to 180'}. Correct it or take the point out.`
    : `The latitude ${lat} is out of range: latitudes run from −90 to 90. Correct it or take the point out.`
  return problem('out-of-range', says, where)
}

/** The problem of a text that should have been a coordinate. */
export function numberProblem(text: string, what: string, where: string): Problem {
  if (text.trim() === '') {
    return problem('coordinates-missing', `The ${what} is missing here. Add it or take the point out.`, where)
  }
  const says = `The ${what} ${quoted(text)} is not a decimal number. Write it as digits with a point, such as 52.4071.`
  return problem('not-a-number', says, where)
}
