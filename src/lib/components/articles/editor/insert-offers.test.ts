import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { renderArticle } from '../../../domain/articles/render-article';
import { offersOf, withWhatLacks } from './insert-offers';
import { writtenDirective } from './written-directive';

const data = measuredArticle();
const errorsOf = (source: string) => renderArticle(source, data, () => '<svg></svg>').errors;

describe('what the insert panel offers', () => {
	it('is every kind of plate, and everything else once', () => {
		const ids = offersOf(data).map(({ id }) => id);
		expect(new Set(ids).size).toBe(ids.length);
		expect(ids).toEqual(
			expect.arrayContaining(['reading', 'plate-scores', 'plate-gains', 'plate-ladder', 'steps'])
		);
	});

	it('is filled in from the data, so that its picture shows something', () => {
		const shown = offersOf(data).filter((offer) => {
			const [error] = errorsOf(writtenDirective(offer.one, offer.values));
			const more = error && withWhatLacks(offer, error, data);
			return !error || (more && errorsOf(writtenDirective(offer.one, more)).length === 0);
		});
		expect(shown.map(({ id }) => id)).toEqual(
			expect.arrayContaining([
				'reading',
				'gain',
				'overall',
				'plate-scores',
				'plate-gains',
				'plate-overall',
				'kit'
			])
		);
	});

	it('takes what an error asks for, and gives up where it asks for nothing', () => {
		const [plate] = offersOf(data).filter(({ id }) => id === 'plate-scores');
		if (!plate) throw new Error('no plate');
		const ask = (message: string, nearest: string[] = []) =>
			withWhatLacks(plate, { line: 1, directive: 'plate', message, nearest }, data);
		expect(ask('Several workloads have this figure. Add workload= to say which.', ['b', 'c'])).toMatchObject({
			workload: 'b'
		});
		expect(ask('There is nothing to draw.')).toBeNull();
	});
});
