/** Words a minute of silent reading, non-fiction, adults (Brysbaert 2019, Journal of Memory and Language 109, 104047). */
export const readingPace = 238;

/** Minutes that reading takes, rounded, at least one where there is anything. @example readingMinutes(1190) === 5 */
export const readingMinutes = (words: number): number =>
	words === 0 ? 0 : Math.max(1, Math.round(words / readingPace));
