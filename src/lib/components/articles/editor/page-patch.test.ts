import fc from 'fast-check';
import { JSDOM } from 'jsdom';
import { beforeAll, afterAll, describe, expect, it, vi } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { pageBlocks } from '../../../domain/articles/page-blocks';
import { renderArticle } from '../../../domain/articles/render-article';
import { PagePatch } from './page-patch';

const { window } = new JSDOM();
beforeAll(() => {
	vi.stubGlobal('document', window.document);
	vi.stubGlobal('Element', window.Element);
});
afterAll(() => vi.unstubAllGlobals());

const data = measuredArticle();
const blocksOf = (source: string) => pageBlocks(renderArticle(source, data, () => '<svg></svg>'));
function page() {
	const host = window.document.createElement('article');
	return { host, patch: new PagePatch(host, (html) => html) };
}

describe('the page beside the source', () => {
	it('is the whole page, after any row of edits', () => {
		const block = fc.constantFrom(
			'<p>a</p>',
			'<p>b</p>',
			'<h2>c</h2>',
			'<ul><li>d</li></ul>',
			'<p>e</p><p>f</p>',
			'text'
		);
		fc.assert(
			fc.property(fc.array(fc.array(block, { maxLength: 8 }), { minLength: 2, maxLength: 6 }), (stages) => {
				const { host, patch } = page();
				for (const stage of stages) {
					patch.update(stage.map((html, line) => ({ line, html })));
					expect(host.innerHTML).toBe(stage.join(''));
				}
			}),
			{ numRuns: 25 }
		);
	});

	it('draws what changed alone, and leaves plates where they are', () => {
		const { host, patch } = page();
		const before = ['First.', 'Second.', '::plate{kind=gains}', 'Third.'];
		expect(patch.update(blocksOf(before.join('\n\n')))).toBe(4);
		const plate = host.querySelector('.plate');
		expect(patch.update(blocksOf(before.with(1, 'Second, longer.').join('\n\n')))).toBe(1);
		expect(patch.update(blocksOf(['New.', ...before.with(1, 'Second, longer.')].join('\n\n')))).toBe(1);
		expect(host.querySelector('.plate')).toBe(plate);
	});

	it('knows the line of what stands on it, also after a line above it', () => {
		const { host, patch } = page();
		patch.update(blocksOf('First.\n\n- a\n- b'));
		patch.update(blocksOf('First.\n\nAnother.\n\n- a\n- b'));
		const item = host.querySelectorAll('li')[1];
		if (!item) throw new Error('no item');
		expect(patch.lineOf(item)?.line).toBe(6);
		expect(patch.elementAt(6)).toBe(item);
		expect(patch.elementAt(3)?.textContent).toBe('Another.');
	});
});
