import naughty from 'big-list-of-naughty-strings/blns.json';
import { describe, expect, it, vi } from 'vitest';
import { JSDOM } from 'jsdom';
import { escapeHtml } from '../../domain/articles/html';
import { maxSourceLength } from '../../domain/articles/limits';
import { renderArticle } from '../../domain/articles/render-article';
import { sanitiseConfig } from '../../domain/articles/sanitise-config';
import { sanitisePage } from './sanitise-page';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 60_000 });

const bare = { campaigns: [], duties: [], zone: 'UTC' };
const render = (source: string) => renderArticle(source, bare, () => '');
const { document } = new JSDOM('').window;

function parsed(html: string): HTMLElement {
	const box = document.createElement('div');
	box.innerHTML = html;
	return box;
}

/** What of a page could run or lead elsewhere. */
const dangers = (box: HTMLElement): string[] =>
	[...box.querySelectorAll('*')].flatMap((node) => {
		const tag = node.localName;
		const found = (sanitiseConfig.ALLOWED_TAGS as string[]).includes(tag) ? [] : [`<${tag}>`];
		for (const { name, value } of node.attributes) {
			if (/^on|^style$|^srcdoc$/i.test(name)) found.push(`${tag} ${name}`);
			if (/^(?:src|href)$/.test(name) && !/^(?:\/(?!\/)|#|https?:\/\/|mailto:)/.test(value)) {
				found.push(`${tag} ${name}=${value}`);
			}
		}
		return found;
	});

/** A text without what HTML and Markdown do not keep: white space, control characters and halves of characters. */
const bareText = (text: string): string => text.toWellFormed().replace(/[\s\p{Cc}\p{Cf}\uFFFD]/gu, '');

/** Letters and digits of a text, in order, as far as a reader has them. */
const letters = (text: string): string => bareText(text).replace(/[^\p{L}\p{N}]/gu, '');

/*
 * Outside check: the strings of npm big-list-of-naughty-strings 1.0.0 (Max Woolf and others, MIT).
 */
describe('every naughty string', () => {
	it('is set without a throw, runs nothing, and stays to be read', () => {
		expect(naughty.length).toBeGreaterThan(450);
		// Each in a place of its own, then all sanitised in one go: each call has a price of its own.
		const pages = naughty.map((text) => render(`Before.\n\n${text}\n\nAfter.`));
		const box = parsed(sanitisePage(pages.map(({ html }) => `<section>${html}</section>`).join('')));
		expect(dangers(box)).toEqual([]);
		expect(box.children).toHaveLength(naughty.length);
		const lost = naughty.filter((text, at) => {
			const shown = box.children[at]?.textContent ?? '';
			const kept = letters(shown);
			// Marks of Markdown are its syntax, and an address is behind its words; the letters of the text are all there.
			return !shown.startsWith('Before.') || !kept.endsWith('After') || !contains(kept, text);
		});
		expect(lost).toEqual([]);
	});

	it('is text in a title, a caption, a term and an attribute', () => {
		const source = (text: string) =>
			`:::note{title="${text.replace(/["{}\n]/g, ' ')}"}\nText.\n:::\n\n| ${text.replace(/[|\n]/g, ' ')} |\n|---|\n| 1 |\n\n![${text.replace(/[[\]\n]/g, ' ')} a](/pictures/a.webp "${text.replace(/["\n]/g, ' ')}")`;
		const pages = naughty.map((text) => `<h2>${escapeHtml(text)}</h2>${render(source(text)).html}`);
		const box = parsed(sanitisePage(pages.map((html) => `<section>${html}</section>`).join('')));
		expect(dangers(box)).toEqual([]);
		const titles = [...box.querySelectorAll(':scope > section > h2')].map((node) =>
			bareText(node.textContent ?? '')
		);
		expect(titles).toEqual(naughty.map(bareText));
	});
});

/** Whether a page has the letters of a source; entities that it decodes and addresses that it follows are passed over. */
function contains(page: string, source: string): boolean {
	const words = source
		.replace(/&#?\w+;/g, ' ')
		.replace(/\]\([^)]*\)/g, ' ')
		.split(/[^\p{L}\p{N}]+/u)
		.map(letters)
		.filter((word) => word !== '');
	let at = 0;
	for (const word of words) {
		const found = page.indexOf(word, at);
		if (found < 0) return false;
		at = found + word.length;
	}
	return true;
}

describe('what is too much', () => {
	it('2 MB of Markdown are refused in words, before they are parsed', () => {
		const { errors, html } = render('# A\n\nSome **text** here.\n\n'.repeat(90_000));
		expect(errors).toHaveLength(1);
		expect(errors[0]?.message).toContain(String(maxSourceLength));
		expect(html).toContain('What you typed is kept.');
	});
	it('20,000 nested quotes are refused in words', () => {
		expect(render('>'.repeat(20_000) + ' a').errors[0]?.message).toContain('nested deeper');
		expect(render('> '.repeat(20_000) + 'a').errors[0]?.message).toContain('nested deeper');
	});
	it('10,000 footnotes are set, each with its way back', () => {
		const ids = Array.from({ length: 10_000 }, (_, at) => at + 1);
		const { html, errors } = render(
			`${ids.map((id) => `Text[^${id}].`).join('\n\n')}\n\n${ids.map((id) => `[^${id}]: N.`).join('\n')}`.replaceAll(
				/(\[\^\d+00\]: N\.)/g,
				'$1\n'
			)
		);
		expect(errors).toEqual([]);
		expect(html.match(/id="fn-/g)).toHaveLength(10_000);
		expect(html).toContain('<a id="fr-10000" href="#fn-10000"');
	});
	it.each([
		['unclosed', ':::note\n\ntext\n\n', 4000],
		['unclosed in one another', ':::compare\n:::side{title=a}\n\n', 8000],
		['closed without being opened', ':::\n\n', 0],
		['nobody knows', ':::nobody\n\ntext\n\n:::\n\n', 4000],
		['in one block', ':::note\n', 4000]
	])('containers by the thousand, %s, are errors in their places', (_, piece, faults) => {
		const page = render(piece.repeat(4000));
		expect(page.html.length).toBeGreaterThan(0);
		expect(page.errors).toHaveLength(faults);
	});
	it.each([
		['footnotes without end', '[^a]: x\n    '],
		['marks of footnotes', 'a[^b] '],
		['open marks', '[^'],
		['terms', ':term{name=a} '],
		['rows of pictures', '![a](/b.webp) ']
	])('%s are set', (_, piece) => {
		expect(render(piece.repeat(Math.floor(30_000 / piece.length))).html.length).toBeGreaterThan(0);
	});
});

/** Characters looked at, counted by the strings a parser takes, so that a slow machine changes nothing. */
describe('the work of looking for a closing line', () => {
	it('grows with the text and not with its square', async () => {
		const { insideOf } = await import('../../domain/articles/container-lines');
		const steps = (count: number) => {
			const piece = `:::note\n${'word word\n'.repeat(20)}`;
			const source = piece.repeat(count);
			const indexOf = vi.spyOn(String.prototype, 'indexOf');
			try {
				for (let at = 0; at < source.length; at += piece.length) insideOf(source.slice(at), 8);
				return indexOf.mock.calls.length;
			} finally {
				indexOf.mockRestore();
			}
		};
		expect(steps(400) / steps(100)).toBeLessThan(5);
	});
});
