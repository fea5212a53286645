/** How the screens look: as the system says, or always light or dark. */
export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

/** Whether a value from outside names a look. */
export const isTheme = (value: unknown): value is Theme => themes.some((theme) => theme === value);
