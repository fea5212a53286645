// Setting an article of 4,000 words with 30 plates, cold and after one key. The control is marked alone on the same text.
import { marked } from 'marked';
import { upTo } from '../fill/insert.mjs';
import { withDomain } from './domain.mjs';
import { longArticle } from './long-article.mjs';

const rounds = 25;

/** Value and control by turns, so that what else runs meets both; the least of each. @param {(() => unknown)[]} works */
function leastMs(...works) {
	const least = works.map(() => Infinity);
	for (let round = 0; round < rounds; round++)
		works.forEach((work, at) => {
			const began = performance.now();
			work();
			least[at] = Math.min(least[at] ?? Infinity, performance.now() - began);
		});
	return least;
}

/** @param {(figure: import('./figure.mjs').Figure) => void} print */
export const measureArticle = (print) =>
	withDomain(async (load) => {
		const { measuredArticle } = await load('/tests/fixtures/article-data.ts');
		const { renderArticle } = await load('/src/lib/domain/articles/render-article.ts');
		const { ArticleReader } = await load('/src/lib/domain/articles/lex-again.ts');
		const data = measuredArticle();
		const [{ workloads, profiles, baseline }] = data.campaigns;
		const slugs = /** @param {{ slug: string }[]} items */ (items) => items.map(({ slug }) => slug);
		const source = longArticle({ workloads: slugs(workloads), profiles: slugs(profiles), baseline });
		// As large as a drawing is.
		const svg = `<svg>${'<g><rect x="1" y="2" width="3" height="4"></rect><text x="1">12.4 s</text></g>'.repeat(90)}</svg>`;
		const draw = () => svg;
		const { wordCount, plates, errors } = renderArticle(source, data, draw);
		if (wordCount < 3900 || plates.length !== 30 || errors.length > 0)
			throw new Error(
				`The article has ${wordCount} words, ${plates.length} plates, ${errors.length} errors.`
			);

		// Data that is another object each time: nothing is known of it.
		const [cold = NaN, coldControl = NaN] = leastMs(
			() => renderArticle(source, { ...data, campaigns: [{ ...data.campaigns[0] }] }, draw),
			() => marked.parse(source)
		);
		print({ name: 'article.cold.ms', value: cold, control: coldControl, goal: '<100', met: cold < 100 });

		const { read } = new ArticleReader();
		const middle = source.indexOf('\n\n', source.length / 2) - 20;
		const typed = upTo(rounds).map((n) => source.slice(0, middle) + 'x'.repeat(n + 1) + source.slice(middle));
		renderArticle(source, data, draw, { read });
		let at = 0;
		const [key = NaN, keyControl = NaN] = leastMs(
			() => renderArticle(typed[at++ % typed.length] ?? '', data, draw, { read }),
			() => marked.parse(source)
		);
		print({ name: 'article.key.ms', value: key, control: keyControl, goal: '<25', met: key < 25 });

		const { claimsIn } = await load('/src/lib/domain/articles/claims/claims.ts');
		// Every passage is new to it, as when an article is opened.
		const anew = upTo(rounds).map((n) => source.replaceAll(' the ', ` the${n} `));
		const [claims = NaN, claimsControl = NaN] = leastMs(
			() => claimsIn(anew[at++ % anew.length] ?? '', data),
			() => marked.parse(source)
		);
		print({ name: 'claims.cold.ms', value: claims, control: claimsControl, goal: '<50', met: claims < 50 });
		claimsIn(source, data);
		const [again = NaN, againControl = NaN] = leastMs(
			() => claimsIn(typed[at++ % typed.length] ?? '', data),
			() => marked.parse(source)
		);
		print({ name: 'claims.key.ms', value: again, control: againControl, goal: '<50', met: again < 50 });
	});
