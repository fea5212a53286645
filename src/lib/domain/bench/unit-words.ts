import type { Direction } from './words';

/** Which way a quantity is better, in words. @example betterWords('lower') // 'less is better' */
export const betterWords = (better: Direction): string =>
	better === 'higher' ? 'more is better' : 'less is better';
