import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { claimsData } from '../../../../../tests/fixtures/claims-data';
import { claimsIn, type ClaimState } from './claims';

interface Label {
	from: number;
	to: number;
	kind: 'number' | 'direction';
	state: ClaimState;
}

const states: Record<string, ClaimState> = {
	a: 'agrees',
	c: 'contradicts',
	m: 'more-than-data',
	n: 'not-backed'
};

/** A marked sentence as it would be written, and its claims. */
function read(marked: string): { source: string; labels: Label[] } {
	const labels: Label[] = [];
	let source = '';
	let done = 0;
	for (const match of marked.matchAll(/\[([^\][]+)=([acmn])\]|<([^<>]+)=([acmn])>/g)) {
		source += marked.slice(done, match.index);
		const said = match[1] ?? match[3] ?? '';
		const state = states[match[2] ?? match[4] ?? ''] ?? 'not-backed';
		labels.push({
			from: source.length,
			to: source.length + said.length,
			kind: match[1] === undefined ? 'direction' : 'number',
			state
		});
		source += said;
		done = match.index + match[0].length;
	}
	return { source: source + marked.slice(done), labels };
}

/** The marked sentences of a file; a quote goes on over two lines. */
const sentencesIn = (name: string) =>
	readFileSync(new URL(`../../../../../tests/fixtures/${name}`, import.meta.url), 'utf8')
		.split('\n')
		.filter((line) => line !== '' && !/^# /.test(line) && !/^## (?!.*[¶.])/.test(line))
		.reduce<string[]>((all, line) => {
			const last = all.at(-1);
			if (line.startsWith('> ') && last?.startsWith('> ')) all[all.length - 1] = `${last}\n${line}`;
			else all.push(line);
			return all;
		}, [])
		.map((line) => read(line.replaceAll(' ¶ ', '\n\n')));

/** Precision and recall of one question. */
class Score {
	right = 0;
	found = 0;
	wanted = 0;
	get precision() {
		return this.found === 0 ? 1 : this.right / this.found;
	}
	get recall() {
		return this.wanted === 0 ? 1 : this.right / this.wanted;
	}
	words = (name: string) =>
		`${name}: precision ${this.precision.toFixed(3)}, recall ${this.recall.toFixed(3)} (${this.right} right of ${this.found} found, ${this.wanted} there)`;
}

function measure(lines: ReturnType<typeof sentencesIn>) {
	const scores = {
		finding: new Score(),
		state: new Score(),
		direction: new Score(),
		contradiction: new Score()
	};
	const wrong: string[] = [];
	for (const { source, labels } of lines) {
		const claims = claimsIn(source, claimsData).filter((claim) => claim.state !== 'bound');
		const same = (label: Label, claim: (typeof claims)[number]) =>
			claim.from === label.from && claim.to === label.to && claim.kind === label.kind;
		const hit = labels.map((label) => claims.find((claim) => same(label, claim)));
		scores.finding.wanted += labels.length;
		scores.finding.found += claims.length;
		scores.finding.right += hit.filter(Boolean).length;
		labels.forEach((label, index) => {
			const claim = hit[index];
			const right = claim?.state === label.state;
			const of = label.kind === 'number' ? scores.state : scores.direction;
			of.wanted += 1;
			if (claim) of.found += 1;
			if (right) of.right += 1;
			if (label.state === 'contradicts') scores.contradiction.wanted += 1;
			if (label.state === 'contradicts' && right) scores.contradiction.right += 1;
			if (!right)
				wrong.push(
					`${source.replaceAll('\n', ' / ')}\n   “${source.slice(label.from, label.to)}” wants ${label.state}, got ${claim?.state ?? 'nothing'} ${claim?.stored ?? ''} ${claim?.why ?? ''}`
				);
		});
		scores.contradiction.found += claims.filter((claim) => claim.state === 'contradicts').length;
		for (const claim of claims)
			if (!labels.some((label) => same(label, claim)))
				wrong.push(
					`${source.replaceAll('\n', ' / ')}\n   “${claim.text}” is no claim, got ${claim.kind} ${claim.state}`
				);
	}
	return { scores, wrong };
}

// Those of the first two have shaped the finder; the third tells what to expect of prose it has not seen.
describe.each([
	['claims.txt', 150, 0.97],
	['claims-unseen.txt', 100, 0.97],
	['claims-unseen-2.txt', 60, 0.93]
])('claims, measured on the sentences of %s', (name, enough, floor) => {
	const lines = sentencesIn(name);
	const { scores, wrong } = measure(lines);
	const report = [
		`${name}: ${lines.length} sentences`,
		...Object.entries(scores).map(([what, score]) => score.words(what)),
		...wrong
	].join('\n');
	process.stdout.write(`${report}\n`);
	it('finds and judges them', () => {
		for (const [what, score] of Object.entries(scores)) {
			expect(score.precision, `${what}\n${report}`).toBeGreaterThanOrEqual(floor);
			expect(score.recall, `${what}\n${report}`).toBeGreaterThanOrEqual(floor);
		}
	});
	it('has every state among them, and sentences with no claim at all', () => {
		expect(lines.length).toBeGreaterThanOrEqual(enough);
		const states = new Set(lines.flatMap(({ labels }) => labels.map((label) => label.state)));
		expect(states).toEqual(new Set(['agrees', 'contradicts', 'more-than-data', 'not-backed']));
		expect(lines.filter(({ labels }) => labels.length === 0).length).toBeGreaterThanOrEqual(10);
	});
});
