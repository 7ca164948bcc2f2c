import { ROAD_WIDTH } from '~/book/limits'
import type { Metres, Seconds } from '~/track/units'
import { formatKilometres, formatLimits, formatNumber, formatSeconds, NBSP } from './measures'

/** Seconds as a lap time: "58.3 s", "1:32.4". */
export function lapTime(value: Seconds): string {
  const tenths = Math.round(value * 10)
  if (tenths < 600) return formatSeconds(value, 1)
  const rest = (tenths % 600) / 10
  return `${Math.floor(tenths / 600)}:${rest.toFixed(1).padStart(4, '0')}`
}

/** Bringing a circuit in: the file, then what was read from it. */
export const importWords = {
  title: 'Bring a circuit in',
  lead: 'A GPS trace of a few laps, or the drawn centreline. GeoJSON, GPX, KML or CSV.',
  file: 'File',
  fileHint: `Up to 20${NBSP}MB. Heights come along where the file has them.`,
  fileMissing: 'Choose the circuit’s file.',
  fileEmpty: (name: string) => `${name} is empty. Export it again, then bring that in.`,
  fileTooLarge: (name: string) =>
    `${name} is larger than 20${NBSP}MB. Export one lap or the centreline alone, then bring that in.`,
  name: 'Name of the circuit',
  nameHint: 'Left empty: the name in the file.',
  read: 'Read the file',
  reading: 'Reading the file',
  cancel: 'Give it up',
  draft: (file: string) => `Read from ${file}`,
  notRead: 'It cannot be read as it is.',
  warnings: 'To know',
  check: 'Does this look right?',
  asRead: 'What the file says',
  way: 'Start line and direction',
  direction: 'Which way it is driven',
  laps: (taken: number, of: number) => `Lap ${taken} of ${of} is taken. Take another?`,
  lap: (index: number) => `Lap ${index}`,
  lapFigures: (length: Metres, time: Seconds | undefined, gap: Seconds | undefined) =>
    [
      formatKilometres(length),
      ...(time === undefined ? [] : [lapTime(time)]),
      ...(gap === undefined || gap <= 2 ? [] : [`a gap of ${formatSeconds(gap, 1)}`]),
    ].join(', '),
  takeLap: 'Take this lap',
  lapMissing: 'Choose a lap.',
  pieces: (used: number, of: number) => `Joined from ${used} of ${of} pieces. Choose others?`,
  piece: (index: number, name: string | undefined) => (name ? `${index} ${name}` : `Piece ${index}`),
  takePieces: 'Join these pieces',
  piecesMissing: 'Choose at least one piece.',
  close: 'Close it with a straight',
  anchor: 'Where on the globe is x = 0, y = 0?',
  anchorAgain: 'Put it elsewhere on the globe?',
  longitude: 'Longitude',
  latitude: 'Latitude',
  anchorHint: 'In degrees, east and north positive: −12.6 and 54.2.',
  anchorWrong: 'A number of degrees, such as −12.6.',
  longitudeOutside: 'Longitude goes from −180 to 180.',
  latitudeOutside: 'Latitude goes from −90 to 90.',
  anchorMissing: 'In degrees.',
  giveAnchor: 'Put it there',
  corners: 'Corners to keep',
  cornersLead: 'Proposed from the bend of the road. Keep, number and name them as drivers do.',
  noCorners: 'No bend of 20° or more was found in this line.',
  oneCorner: 'Keep at least one corner.',
  settings: 'The circuit',
  circuitName: 'Name',
  circuitNameMissing: 'What is the circuit called?',
  layoutName: 'Layout',
  layoutHint: 'Full circuit, short circuit: whichever this line is.',
  layoutDefault: 'Full circuit',
  layoutMissing: 'Which layout is it?',
  timeZone: 'Time zone',
  timeZoneChoose: 'Choose the circuit’s zone',
  timeZoneMissing: 'Timetables are told in the circuit’s own time. Choose its zone.',
  roadWidth: 'Road width, m',
  roadWidthHint: 'From edge to edge, where most of the lap is as wide.',
  roadWidthMissing: 'Give it in metres; 12 is usual.',
  roadWidthOutside: `Roads are ${formatLimits(ROAD_WIDTH)} wide.`,
  save: 'Keep the circuit',
  again: 'Bring another file',
  datum: 'from the tightest point',
  turnName: (number: string) => `Turn ${number}`,
  stationFigure: (station: number) => `${formatNumber(station)}${NBSP}m`,
} as const
