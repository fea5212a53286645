import { expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { renderArticle } from '../render-article';
import { putDrawings, takeDrawings } from './plate-drawings';

it('takes the drawings out of a page and puts them back where they were', () => {
	const source =
		'One.\n\n::plate{kind=gains}\n\nTwo.\n\n::plate{kind=scores workload=source-build}\n\n::results';
	const page = renderArticle(
		source,
		measuredArticle(),
		(spec) => `<svg><text>${spec.kind}</text></svg>`
	).html;
	const { page: bare, drawings } = takeDrawings(page);
	expect(bare).not.toContain('<svg');
	expect([...drawings.values()]).toEqual(['<svg><text>gains</text></svg>', '<svg><text>scores</text></svg>']);
	expect(putDrawings(bare, (key) => drawings.get(key))).toBe(page);
});
