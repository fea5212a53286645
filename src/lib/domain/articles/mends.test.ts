import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../tests/fixtures/article-data';
import { faultsOf } from './mends';
import { renderArticle } from './render-article';
import { directiveAt, writtenDirectives } from './written-directives';

const data = measuredArticle();
const render = (source: string) => renderArticle(source, data, () => '<svg></svg>');
const faults = (source: string) => faultsOf(source, render(source).errors);

describe('a fault in a source', () => {
	it('is underlined to the name that nobody knows, with the nearest', () => {
		const source = 'First line.\n\nIt takes :reading{workload=source-biuld profile=stock} here.';
		const [fault] = faults(source);
		expect(source.slice(fault?.from, fault?.to)).toBe('source-biuld');
		expect(fault?.mends[0]).toMatchObject({ words: 'Change to source-build', insert: 'source-build' });
	});

	it('is mended by its first change', () => {
		for (const source of [
			'A :gain{workload=source-build profile=huge-pagse} b',
			'A :gian{workload=source-build profile=huge-pages} b',
			'A :gain{worklod=source-build profile=huge-pages} b',
			'::plate{kind=gain}',
			'::plate{kind=gains profiles=huge-pages,stokc}',
			'A :reading{workload=source-build profile=stock show=mena} and :reading{workload=source-build profile=stock}.'
		]) {
			const mend = faults(source)[0]?.mends[0];
			if (!mend) throw new Error(`no mend for ${source}`);
			const mended = source.slice(0, mend.from) + mend.insert + source.slice(mend.to);
			expect(render(mended).errors, mended).toEqual([]);
		}
	});

	it('takes each of two alike for itself', () => {
		const source = 'A :reading{workload=nope profile=stock} b :reading{workload=none profile=stock}';
		expect(faults(source).map(({ from, to }) => source.slice(from, to))).toEqual(['nope', 'none']);
	});

	it('offers what is lacking where it would go', () => {
		const [fault] = faults('A :reading{profile=stock} b');
		expect(fault?.mends[0]?.insert).toMatch(/^ workload=\w/);
	});

	it('is at its line where it is about no directive', () => {
		const source = 'One.\n\n![](/a.png)';
		expect(faults(source)).toMatchObject([{ from: 6, to: source.length, mends: [] }]);
	});
});

describe('directives in a source', () => {
	it('are those that the renderer reads as ones', () => {
		const source =
			'At 10:30 a :gain{workload=a\nprofile="b c"} ratio 1:2\n\n::results\n\n:::note\nx\n:::\n\nsee: this';
		expect(writtenDirectives(source).map(({ name, colons }) => [name, colons])).toEqual([
			['gain', 1],
			['results', 2],
			['note', 3]
		]);
		const [gain] = writtenDirectives(source);
		expect(gain?.attributes.map(({ name, value }) => [name, value])).toEqual([
			['workload', 'a'],
			['profile', 'b c']
		]);
	});

	it('are found at a place inside them, half typed as well', () => {
		const source = 'It takes :reading{workload=sou';
		expect(directiveAt(source, source.length)).toMatchObject({ name: 'reading', closed: false });
		expect(directiveAt(source, 3)).toBeUndefined();
	});
});
