/** Metres that a measure may have, the least and the most: anything else is a slip of the pen. Both are allowed. */
export type Limits = readonly [least: number, most: number]

export const ROAD_WIDTH: Limits = [4, 40]
export const CAR_LENGTH: Limits = [2, 8]
export const CAR_WIDTH: Limits = [1, 3]
/** Height of the driver's eye over the road. */
export const EYE_HEIGHT: Limits = [0.4, 2.5]
