import { describe, expect, it } from 'vitest';
import { renderArticle } from './render-article';

const data = {
	campaigns: [],
	duties: [],
	zone: 'UTC',
	glossary: [
		{
			slug: 'fabric-clock',
			term: 'fabric clock',
			explanation: 'The clock of what joins "chips" & memory.',
			aliases: ['FCLK']
		},
		{ slug: 'boost', term: 'boost', explanation: 'A clock above the rated one.' }
	]
};
const render = (source: string) => renderArticle(source, data, () => '');

describe('terms of the glossary', () => {
	it('are explained at the end, once, with a way there and back, and by a title on the way', () => {
		const { html, uses, errors } = render(
			'The :term{name=fabric-clock}, or :term{name=fclk}, and :term{name=boost text="boosts"}.'
		);
		expect(errors).toEqual([]);
		expect(uses.terms).toEqual(['fabric-clock', 'boost']);
		expect(html).toContain(
			'<dfn><a class="term" id="tr-fabric-clock" href="#term-fabric-clock" title="The clock of what joins &quot;chips&quot; &amp; memory.">fabric clock</a></dfn>'
		);
		expect(html.match(/<dfn>/g)).toHaveLength(2);
		expect(html).toContain('>fclk</a>');
		expect(html).toContain('>boosts</a>');
		expect(html.match(/id="term-/g)).toHaveLength(2);
		expect(html.indexOf('id="term-boost"')).toBeLessThan(html.indexOf('id="term-fabric-clock"'));
		expect(html).toContain('href="#tr-boost"');
	});
	it('that nobody knows are errors with the nearest', () => {
		expect(render(':term{name=fabric-clok}').errors[0]).toMatchObject({
			directive: 'term',
			nearest: ['fabric-clock']
		});
		expect(
			renderArticle(':term{name=a}', { ...data, glossary: undefined }, () => '').errors[0]?.message
		).toContain('The glossary has no terms yet.');
	});
	it('leave a page without terms as it is', () => {
		expect(render('Text.').html).toBe('<p data-line="1">Text.</p>');
	});
});
