import { z } from 'zod'
import { CAR_LENGTH, CAR_WIDTH, EYE_HEIGHT } from '~/book/limits'
import { figure, nameField } from '~/components/form/figure'
import { carWords as words } from '~/words/cars'

const { missing, wrong } = words

/** What the form of a car sends. The id is the page's for a new car, the car's own for a change. */
export const carSchema = z.object({
  id: z.uuid(),
  name: nameField(words.nameMissing),
  length: figure({ limits: CAR_LENGTH, missing, wrong, outside: words.lengthOutside }),
  width: figure({ limits: CAR_WIDTH, missing, wrong, outside: words.widthOutside }),
  eyeHeight: figure({ limits: EYE_HEIGHT, missing, wrong, outside: words.eyeOutside }),
})
