/** The one place that reads the time; a service gets it through its Context. */
export const clock = { now: (): Date => new Date() };
