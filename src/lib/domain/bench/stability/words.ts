export const stressKinds = ['heaviest', 'everyday'] as const;
/** Whether a stress is the heaviest load there is, or what a machine meets in ordinary work. */
export type StressKind = (typeof stressKinds)[number];

export const attemptOutcomes = ['passed', 'failed', 'stopped'] as const;
/** How an attempt ended; *stopped* says nothing of stability either way. */
export type AttemptOutcome = (typeof attemptOutcomes)[number];
