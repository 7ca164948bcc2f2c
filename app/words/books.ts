import type { Metres } from '~/track/units'
import { count, formatKilometres } from './measures'

/** A team's books, and making one. */
export const bookWords = {
  title: 'Books',
  lead: 'One book for each layout and car.',
  make: 'Start a book',
  none: 'No book yet.',
  noneQuestion: 'Which circuit do you go to next?',
  archived: 'archived',
  entry: (layout: string, length: Metres, car: string) => `${layout}, ${formatKilometres(length)}, ${car}`,
  state: (corners: number, marks: number) =>
    marks === 0 ? `${count(corners, 'corner')}, no marks yet` : `${count(corners, 'corner')}, ${count(marks, 'mark')}`,
  changed: (when: string) => `changed ${when}`,
  newTitle: 'Start a book',
  newLead: 'One brake mark in each corner already makes a book that reads.',
  layout: 'Circuit and layout',
  layoutChoose: 'Choose the road',
  layoutMissing: 'Which circuit is it for?',
  layoutGone: 'That circuit is not there any more. Choose another.',
  layoutLine: (circuit: string, layout: string, length: Metres) => `${circuit}, ${layout}, ${formatKilometres(length)}`,
  car: 'Car',
  carChoose: 'Choose the car',
  carMissing: 'Which car is it for?',
  carGone: 'That car is not there any more. Choose another.',
  carHint: 'Car lengths are this car’s, as it is now.',
  name: 'Name of the book',
  nameHint: 'Left empty: the circuit’s name.',
  button: 'Make the book',
  cancel: 'Not now',
  needsCircuit: 'A book needs a circuit.',
  needsCircuitQuestion: 'Have you a lap of it, or its centreline, as a file?',
  needsCar: 'A book needs a car.',
  needsCarQuestion: 'How long is yours, and how high does its driver sit?',
  addCar: 'Add a car',
} as const
