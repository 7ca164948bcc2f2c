import { z } from 'zod'
import { figure, nameField } from '~/components/form/figure'
import { carWords as words } from '~/words/cars'

const { missing, wrong } = words

/** What the form of a car sends. The id is the page's for a new car, the car's own for a change. */
export const carSchema = z.object({
  id: z.uuid(),
  name: nameField(words.nameMissing),
  length: figure({ least: 2, most: 8, missing, wrong, outside: words.lengthOutside }),
  width: figure({ least: 1, most: 3, missing, wrong, outside: words.widthOutside }),
  eyeHeight: figure({ least: 0.4, most: 2.5, missing, wrong, outside: words.eyeOutside }),
})
