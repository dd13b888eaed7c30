/** A mark along an axis: where, in percent from the left or the top, and what is written at it. */
export interface AxisMark { at: number, label: string }
