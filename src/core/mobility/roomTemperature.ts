/**
 * Temperatures at which a model of one temperature is used without a warning: about 5 K to either side, K. That far away
 * the mobility of lightly doped silicon differs by 4 %, the accuracy of such models; 23, 25 and 27 C lie within both.
 */

type Span = readonly [number, number];

/** For models fitted at 300 K: 22 to 32 C. */
export const ROOM_300_K: Span = [295.15, 305.15];
/** For a standard at 23 C: 18 to 28 C. */
export const ROOM_23_C: Span = [291.15, 301.15];
