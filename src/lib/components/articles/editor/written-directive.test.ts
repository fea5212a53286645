import { describe, expect, it } from 'vitest';
import { gain } from '../../../domain/articles/directives/gain';
import { plate } from '../../../domain/articles/directives/plate';
import { disclosure } from '../../../domain/articles/directives/disclosure';
import { renderArticle } from '../../../domain/articles/render-article';
import { writtenDirective } from './written-directive';

describe('a directive built by the insert panel', () => {
	it('names what was chosen, in the directive’s own order, and leaves the rest out', () => {
		expect(writtenDirective(gain, { profile: 'fixed-495', workload: 'tile-render', over: '' })).toBe(
			':gain{workload=tile-render profile=fixed-495}'
		);
		expect(writtenDirective(disclosure, {})).toBe('::disclosure');
	});

	it('quotes what has spaces, and lets nothing out of the quotes', () => {
		expect(writtenDirective(plate, { kind: 'gains', title: 'What "stock" leaves {here}' })).toBe(
			'::plate{kind=gains title="What stock leaves here"}'
		);
	});

	it('is read back by the renderer as that directive', () => {
		const data = { campaigns: [], duties: [], zone: 'UTC' };
		const rendered = renderArticle(
			`It gains ${writtenDirective(gain, { workload: 'a', profile: 'b' })} here.`,
			data,
			() => ''
		);
		expect(rendered.errors.map((error) => error.directive)).toEqual(['gain']);
	});
});
