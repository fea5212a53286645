import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { claimsData } from '../../../../../tests/fixtures/claims-data';
import { parseMarkdown } from '../markdown';
import { claimsIn } from './claims';

const sentences = readFileSync(new URL('../../../../../tests/fixtures/claims.txt', import.meta.url), 'utf8')
	.split('\n')
	.filter((line) => line !== '' && !line.startsWith('#'))
	.map((line) => line.replace(/[[<]([^\][<>=]+)=[acmn][\]>]/g, '$1').replaceAll('¶', ' '));

const filler =
	'The board spends a budget while one core works, and that core gets nearly all of it. As more of them wake, each gets less, and the clock comes down step by step until a limit stops it. For short tasks there is nothing to win here, and for long ones there is, because the limit is set for the worst cooler that its maker expects.';

/** An article of some 4,000 words in which every fourth sentence or so has claims, as a guide has. */
const article = Array.from({ length: 34 }, (_, index) => {
	const said = sentences[(index * 3) % sentences.length] ?? '';
	return `${index % 9 === 0 ? `## Part ${index}\n\n` : ''}${filler.slice(0, 200 + (index % 5) * 25)} ${said}\n\n${filler}`;
}).join('\n\n');

/** Processor time of the fastest of several runs, in ms: what other programs take is not in it. */
function fastest(runs: number, work: (run: number) => void): number {
	let best = Infinity;
	for (let run = 0; run < runs; run += 1) {
		const before = process.cpuUsage();
		work(run);
		const { user, system } = process.cpuUsage(before);
		best = Math.min(best, (user + system) / 1000);
	}
	return best;
}

describe('claims keep up with typing', () => {
	it('in an article of 4,000 words and more, cold and after a key', () => {
		const words = article.split(/\s+/).length;
		expect(words).toBeGreaterThan(4000);
		claimsIn(article, claimsData);
		const parse = fastest(8, () => parseMarkdown(article));
		const facts = fastest(2, () => claimsIn('', structuredClone(claimsData)));
		// Every passage is new to it, as when an article is opened.
		const cold = fastest(4, (run) => claimsIn(article.replaceAll('limit', `limit${run}`), claimsData));
		const key = fastest(8, (run) => claimsIn(article.replace('wake', `wake ${run}`), claimsData));
		const count = claimsIn(article, claimsData).length;
		const ms = (value: number) => `${value.toFixed(1)} ms`;
		process.stdout.write(
			`claims of ${words} words (${count} claims): cold ${ms(cold)}, after a key ${ms(key)}; parsing alone ${ms(parse)}, the data once ${ms(facts)}\n`
		);
		// Against parsing in the same run, so that a slow machine says the same.
		expect(key).toBeLessThan(Math.max(50, 4 * parse));
		expect(cold).toBeLessThan(Math.max(50, 40 * parse));
	}, 20_000);
});
