export const intervalMethods = ['mean', 'ratio', 'overall', 'ratio-of-medians'] as const;
export type IntervalMethod = (typeof intervalMethods)[number];
