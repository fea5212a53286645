import { expect, it } from 'vitest';
import { readingMinutes, readingPace } from './reading-time';

it('counts 238 words a minute, the mean of silent reading of non-fiction in Brysbaert 2019', () => {
	expect(readingPace).toBe(238);
	expect([0, 1, 238, 1190, 4000].map(readingMinutes)).toEqual([0, 1, 1, 5, 17]);
});
