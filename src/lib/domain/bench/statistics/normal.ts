import { studentQuantile, upperTailP } from './interval';

// Student's t this far out is the normal distribution to eleven digits, and needs no second library.
const far = 1e11;

/** Quantile of the standard normal distribution. RangeError outside 0 < p < 1. @example normalQuantile(0.975) // 1.95996… */
export const normalQuantile = (p: number): number => studentQuantile(p, far);

/** Share of the standard normal distribution above z. @example normalUpperTail(1.959964) // 0.025 */
export const normalUpperTail = (z: number): number => upperTailP(z, far);
