import type { KerbNote } from '~/book/place'

/** What a card says in words; a field that is left out is empty. */
export interface CardTexts {
  line?: string
  kerbs?: KerbNote[]
  surface?: string
  water?: string
  car?: string
  mistake?: string
  traffic?: string
  limits?: string
  backup?: string
  next?: string
}

/** What the team wrote on its cards, by corner number. */
export const cardTexts: Record<string, CardTexts> = {
  '1': {
    line: 'Stay left of the grid to the drain. One turn of the wheel, kerb, then straighten early: Groyne wants you right.',
    kerbs: [{ part: 'Apex', words: 'right wheels, second half. Low, takes a whole wheel. Wet: half' }],
    mistake: 'Running out to the left edge and missing the way into Groyne.',
    traffic: 'Cars leave the pit lane on the right until the bend. Leave them the inside.',
    limits: 'Outside edge, judged at post 2.',
    next: 'Give up the exit: the run to Groyne is short.',
  },
  '2': {
    line: 'Brush the brake, fourth, and let it roll. Late apex, the road opens uphill.',
    kerbs: [
      { part: 'Apex', words: 'left wheels to the line, no more. The drop behind it unsettles the car' },
      { part: 'Exit', words: 'right wheels, all of it. Flat' },
    ],
    mistake: 'Braking as for a slow corner and waiting in the middle.',
    next: 'Uphill to Lookout. Carry what you have.',
  },
  '4': {
    line: 'Flat. Look at the hut roof, stay left of the middle, do not move the wheel twice.',
    car: 'Still loading up from Lookout; light grip on the left rear for the first lengths.',
    next: 'Be straight before Slipway: braking begins where the bend ends.',
  },
  '5': {
    line: 'Downhill braking, car straight. Turn at the 50 board, slow hands, kerb late.',
    kerbs: [
      { part: 'Apex', words: 'right wheels on the line. The kerb is steep' },
      { part: 'Exit', words: 'left wheels, middle of it. Wet: leave it' },
    ],
    surface: 'Two bumps in the braking zone, the second where third goes in.',
    car: 'Locks the inside front if the brake is not eased at the second bump.',
    mistake: 'Braking where the simulator does. The hill is steeper here.',
    traffic: 'The place to pass: inside, done before the 50 board.',
    backup: 'Hut hidden by a car: the 100 board, one length later',
  },
  '6': {
    line: 'Give this one up for the next. In from the right, left kerb, then leave the car in the middle.',
    kerbs: [{ part: 'Apex', words: 'left wheels, a wheel and no more. Throws the car in the wet' }],
    mistake: 'Running wide to the joint and having no road left for the right.',
    limits: 'Two wheels over the left kerb counts as cutting.',
    next: 'The right follows at once.',
  },
  '7': {
    line: 'From the middle of the road. Lift, turn at the second bundle, throttle before the kerb ends.',
    kerbs: [
      { part: 'Apex', words: 'right wheels to the line. No grip on the kerb itself' },
      { part: 'Exit', words: 'left wheels, all of it, along the wall' },
    ],
    car: 'Steps out on the kerb where the simulator grips.',
    mistake: 'Trusting the kerb.',
    traffic: 'No room for two.',
  },
  '8': {
    line: 'Hairpin. Brake straight over the ripples, turn late at the barrier, one kerb, straighten.',
    kerbs: [
      { part: 'Apex', words: 'right wheels on the line, short kerb' },
      { part: 'Exit', words: 'left wheels on the line, the kerb costs drive' },
    ],
    surface: 'Ripples from 110 before. They are not in the simulator.',
    car: 'Front wheels skip over the ripples: less pedal there, more after.',
    mistake: 'Turning in with the brake still full.',
    traffic: 'The other place to pass. Let faster cars by on the right on the way out.',
    backup: 'Post hidden: half-way between the 150 and the 100 board',
  },
  '9': {
    line: 'Brake before the crest of the lane, turn past the board, stay tight: Shingle comes soon.',
    kerbs: [{ part: 'Apex', words: 'left wheels on the kerb, first half. Smooth' }],
    surface: 'Repaired strip from 193 to 161 before, no harm to it.',
    mistake: 'Opening the wheel too early and ending on the outside kerb.',
    next: 'Half the exit kerb is enough.',
  },
  '10': {
    line: 'Brush, third, and through. Keep it in the middle on the way out.',
    kerbs: [{ part: 'Apex', words: 'left wheels on the line' }],
    mistake: 'Using all the road: Foghorn then begins on the wrong side.',
    next: 'Across to the left for Foghorn.',
  },
  '11': {
    line: 'Long, tightens. Brake to the fog signal, keep it wide until the kerb shows, late apex.',
    kerbs: [{ part: 'Apex', words: 'right wheels on the kerb, last third' }],
    car: 'Understeers while it is loaded; wait, do not add lock.',
    mistake: 'Seeing the first half of the bend and turning for it.',
    limits: 'Inside edge, judged at the panel.',
    next: 'Middle of the road for Eelgrass.',
  },
  '12': {
    line: 'A lift at the end of the kerb, turn at the reed post, one kerb.',
    kerbs: [
      { part: 'Apex', words: 'left wheels on the kerb' },
      { part: 'Exit', words: 'right wheels on the line' },
    ],
    mistake: 'Braking. A lift is enough in the dry.',
  },
  '13': {
    line: 'Wide in, let the car slow by itself after the first brake, late apex, straight past the pit entry.',
    kerbs: [
      { part: 'Apex', words: 'right wheels on the line' },
      { part: 'Exit', words: 'left wheels on the kerb, in the dry only' },
    ],
    water: 'Water stands 70 to 96 after, left, until noon.',
    mistake: 'Throttle before the car points at the pit wall.',
    traffic: 'Cars for the pit lane keep right from here.',
    next: 'The whole start straight hangs on this exit.',
  },
}
