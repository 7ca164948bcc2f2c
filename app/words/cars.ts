import { CAR_LENGTH, CAR_WIDTH, EYE_HEIGHT } from '~/book/limits'
import { formatLimits } from './measures'

/** A team's cars: what a book needs to know of one. */
export const carWords = {
  title: 'Cars',
  lead: 'A book counts in this car’s lengths and looks from its seat.',
  add: 'Add a car',
  addButton: 'Add the car',
  change: (name: string) => `Change ${name}`,
  changeButton: 'Keep the changes',
  cancel: 'Leave it as it is',
  none: 'No car yet.',
  noneQuestion: 'How long is yours, and how high does its driver sit?',
  columns: { name: 'car', length: 'length', width: 'width', eye: 'eye height' },
  name: 'Name',
  nameHint: 'As the team calls it: Car 41',
  length: 'Length, m',
  width: 'Width, m',
  eye: 'Eye over the road, m',
  eyeHint: 'The driver’s eye, seated with his helmet on.',
  pinned: 'Books keep the length they were made with.',
  nameMissing: 'What does the team call it?',
  missing: 'Give it in metres.',
  wrong: 'A number in metres, such as 4.6.',
  lengthOutside: `Cars are ${formatLimits(CAR_LENGTH)} long.`,
  widthOutside: `Cars are ${formatLimits(CAR_WIDTH)} wide.`,
  eyeOutside: `An eye sits ${formatLimits(EYE_HEIGHT)} over the road.`,
} as const
