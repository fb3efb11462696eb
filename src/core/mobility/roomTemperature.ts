/**
 * Temperatures at which a model of one temperature is used without a warning: 4 K to either side, K. That far away the
 * mobility of lightly doped silicon differs by 3 %, the accuracy of such models; 23, 25 and 27 C lie within.
 */

type Span = readonly [number, number];

/** For models fitted at 300 K. */
export const ROOM_300_K: Span = [296, 304];
/** For a standard at 23 C. */
export const ROOM_23_C: Span = [292.15, 300.15];
