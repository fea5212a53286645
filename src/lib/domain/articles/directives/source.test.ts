import { describe, expect, it } from 'vitest';
import { claimsData } from '../../../../../tests/fixtures/claims-data';
import { claimsIn } from '../claims/claims';
import { renderArticle } from '../render-article';

const render = (source: string) => renderArticle(source, claimsData, () => '');

describe('a number from elsewhere', () => {
	it('prints with where it comes from, for readers to see', () => {
		const { html, plain, errors } = render(
			'The tile render gains :source{text="20 %" from="the maker’s sheet"} there.'
		);
		expect(errors).toEqual([]);
		expect(plain).toBe('The tile render gains 20 % (the maker’s sheet) there.');
		expect(html).toContain('<span class="sourced">20 % (the maker’s sheet)</span>');
	});
	it('is left alone by the claims', () => {
		expect(claimsIn('With fixed 4.95 the tile render gains 20 %.', claimsData)).toMatchObject([
			{ state: 'contradicts' }
		]);
		expect(
			claimsIn('With fixed 4.95 the tile render gains :source{text="20 %" from="its maker"}.', claimsData)
		).toEqual([]);
	});
	it.each([
		':source{text="20 %"}',
		':source{text="20 %" from=""}',
		':source{from="its maker"}',
		':source{text=" " from="x"}'
	])('needs both: %s', (source) => expect(render(`It gains ${source}.`).errors).toHaveLength(1));
	it('is escaped', () => {
		expect(render(':source{text="<b>9</b>" from="<i>"}').html).toContain('&lt;b&gt;9&lt;/b&gt; (&lt;i&gt;)');
	});
});
