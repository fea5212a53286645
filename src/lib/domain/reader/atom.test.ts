import { JSDOM } from 'jsdom';
import { describe, expect, it } from 'vitest';
import { atom, type Feed } from './atom';

const namespace = 'http://www.w3.org/2005/Atom';
// The dates are those of RFC 3339 section 5.8 and of the feed in RFC 4287 section 1.1.
const feed: Feed = {
	id: 'tag:desk.example,2026:feed',
	title: 'Bench & <print>',
	subtitle: 'Measure, then print.',
	home: 'https://desk.example/',
	self: 'https://desk.example/feed.atom',
	now: new Date('1985-04-12T23:20:50.520Z'),
	entries: [
		{
			id: 'tag:desk.example,2026:article-1',
			title: 'Robots “run” <script>',
			href: 'https://desk.example/articles/a?b=1&c=2',
			author: 'Ines Calloway',
			published: new Date('2003-12-13T18:30:02Z'),
			updated: new Date('2003-12-13T18:30:02Z'),
			summary: 'Some text.\u0007'
		},
		{
			id: 'tag:desk.example,2026:article-2',
			title: 'Older',
			href: 'https://desk.example/articles/b',
			author: 'Ines Calloway',
			published: new Date('2003-01-01T00:00:00Z'),
			updated: new Date('2003-12-14T00:00:00Z'),
			summary: ''
		}
	]
};
const read = (xml: string) => new new JSDOM().window.DOMParser().parseFromString(xml, 'application/xml');

describe('the Atom feed', () => {
	it('is well-formed whatever the titles hold', () => {
		const parsed = read(atom(feed));
		expect(parsed.querySelector('parsererror')).toBeNull();
		expect(parsed.querySelector('entry title')?.textContent).toBe('Robots “run” <script>');
	});

	it('has what RFC 4287 sections 4.1.1 and 4.1.2 require, once each', () => {
		const root = read(atom(feed)).documentElement;
		const own = (parent: Element, name: string) =>
			[...parent.children].filter((child) => child.localName === name && child.namespaceURI === namespace);
		for (const name of ['id', 'title', 'updated']) expect(own(root, name)).toHaveLength(1);
		const entries = own(root, 'entry');
		expect(entries).toHaveLength(2);
		for (const entry of entries)
			for (const name of ['id', 'title', 'updated', 'author', 'summary'])
				expect(own(entry, name)).toHaveLength(1);
		const ids = entries.map((entry) => own(entry, 'id')[0]?.textContent);
		expect(new Set(ids).size).toBe(ids.length);
	});

	it('dates itself by its newest change, as RFC 3339 with capital T and Z (RFC 4287 section 3.3)', () => {
		const dates = [...read(atom(feed)).getElementsByTagNameNS(namespace, 'updated')].map(
			(e) => e.textContent ?? ''
		);
		expect(dates[0]).toBe('2003-12-14T00:00:00.000Z');
		for (const date of dates) expect(date).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/);
		expect(read(atom({ ...feed, entries: [] })).querySelector('updated')?.textContent).toBe(
			'1985-04-12T23:20:50.520Z'
		);
	});
});
