import type { ArticleData, CampaignData } from '../data';

/** What a name in prose stands for. */
export type Named =
	| { kind: 'workload'; slugs: string[] }
	| { kind: 'profile'; slugs: string[] }
	/** A setting or a derived fact, by its name. */
	| { kind: 'setting'; names: string[] }
	| { kind: 'other' };

/** A name where it stands in a passage. */
export interface Mention {
	from: number;
	to: number;
	named: Named;
	/** A whole name, so that a number in it is no claim. */
	whole: boolean;
	/** Named by a directive and not by the words: it is about that directive's number first. */
	ofDirective?: true;
}

interface Alias {
	words: string[];
	named: Named;
	whole: boolean;
	/** Only behind one of these words. */
	after?: ReadonlySet<string>;
}

/** Names of an article's data by their first word. */
export type Lexicon = Map<string, Alias[]>;

/** One word of a text, lower case, with where it stands. */
interface Word {
	text: string;
	from: number;
	to: number;
}

const wordShape = /[\p{L}\p{N}]+(?:[.,]\d+)*/gu;
const wordsOf = (text: string): Word[] =>
	[...text.matchAll(wordShape)].map((match) => ({
		text: match[0].toLowerCase(),
		from: match.index,
		to: match.index + match[0].length
	}));
const plainWords = (name: string): string[] => wordsOf(name).map((word) => word.text);

const determiners = new Set(
	'the our this that a an each every both same in of for under during whole long long-running tile'.split(' ')
);
const profileNouns =
	'profile profiles clock clocks setting settings fans fan rate limit limits kit way mode curve one'.split(
		' '
	);
const outOfBox = [
	'stock',
	'out of the box',
	'as it comes',
	'as they come',
	'as shipped',
	'the baseline',
	'default',
	'the defaults',
	'left alone',
	'untouched'
];
const small = new Set('at with and the of under over in by to from for a an as on'.split(' '));

/** Quantities that many things have, so that their names say nothing. */
const generic = new Set(
	'time|rate|average rate|power|energy|temperature|throughput|frequency|score'.split('|')
);

/** The noun at the end of a name, where the name is a plain pair such as “Tile render”. */
function headNoun(words: string[]): string | null {
	const last = words.at(-1) ?? '';
	return words.length > 1 && !words.some((word) => small.has(word)) && last.length > 2 && !/\d/.test(last)
		? last
		: null;
}

class Builder {
	readonly aliases = new Map<string, Alias>();

	add(words: string[], named: Named, whole: boolean, after?: ReadonlySet<string>): void {
		if (words.length === 0) return;
		const key = words.join(' ');
		const known = this.aliases.get(key);
		// A name that several things have stands for all of them.
		if (known && !after) delete known.after;
		if (known && known.named.kind === named.kind && 'slugs' in known.named && 'slugs' in named) {
			known.named.slugs = [...new Set([...known.named.slugs, ...named.slugs])];
			return;
		}
		if (known && 'names' in known.named && 'names' in named) {
			known.named.names = [...new Set([...known.named.names, ...named.names])];
			return;
		}
		if (!known) this.aliases.set(key, { words, named, whole, ...(after ? { after } : {}) });
	}

	workload({ slug, name, quantity }: CampaignData['workloads'][number]): void {
		const named = (): Named => ({ kind: 'workload', slugs: [slug] });
		const words = plainWords(name);
		this.add(words, named(), true);
		this.add(plainWords(slug), named(), true);
		const head = headNoun(words);
		if (head) {
			this.add([head], named(), false, determiners);
			if (/(?:render|encode|build|pack|copy|sieve|search|compile)$/.test(head))
				this.add([`${head.replace(/e$/, '')}ing`], named(), false);
		}
		const first = words[0];
		if (first && quantity === 'power' && words.length > 1) this.add([first], named(), false, new Set(['at']));
		if (first && words.length > 1 && words.length < 4 && first.length > 3 && head)
			this.add([first, 'test'], named(), false);
		if (!generic.has(quantity)) {
			this.add(plainWords(quantity), named(), false);
		}
	}

	profile({ slug, name }: CampaignData['profiles'][number], isStock: boolean): void {
		const named = (): Named => ({ kind: 'profile', slugs: [slug] });
		const [front = '', ...rest] = name.split(/,(?!\d)/);
		this.add(plainWords(name), named(), true);
		this.add(plainWords(front), named(), true);
		for (const part of rest) this.add(plainWords(part), named(), false, new Set(['the', 'for']));
		this.add(plainWords(slug), named(), true);
		if (isStock) for (const words of outOfBox) this.add(words.split(' '), named(), false);
		for (const word of plainWords(front)) {
			if (/^\d+[.,]\d+$/.test(word)) {
				this.add([word, 'ghz'], named(), false);
				this.add([word], named(), false, new Set(['at', 'fixed']));
			} else if (!small.has(word) && word.length > 3) {
				const noun = /^\d+$/.test(word) ? [] : profileNouns;
				for (const one of noun) if (one !== word) this.add([word, one], named(), false);
				if (/ing$/.test(word)) this.add([word], named(), false);
			}
		}
	}

	settings(campaign: CampaignData): void {
		for (const { settings, derived } of campaign.profiles) {
			for (const name of [...settings.map((one) => one.setting), ...derived.map((one) => one.name)]) {
				const named = (): Named => ({ kind: 'setting', names: [name] });
				const words = plainWords(name.split(/,(?!\d)/)[0] ?? '');
				this.add(words, named(), true);
				if (words.length > 2 && !words.slice(-2).some((word) => small.has(word) || word === 'above'))
					this.add(words.slice(-2), named(), false);
			}
		}
		for (const name of [
			campaign.name,
			campaign.rig.name,
			campaign.rig.firmware,
			campaign.rig.driver,
			campaign.rig.os
		])
			this.other(name);
		for (const { partName } of campaign.kit) this.other(partName);
	}

	private other(name: string): void {
		const front = name.split(/,(?!\d)/)[0] ?? '';
		for (const one of [name, front])
			if (!/^[\d.]*$/.test(one)) this.add(plainWords(one), { kind: 'other' }, true);
	}
}

/** The names an article's data has, with the near words people use for them. */
export function lexiconOf(data: ArticleData): Lexicon {
	const builder = new Builder();
	for (const campaign of data.campaigns) {
		for (const workload of campaign.workloads) builder.workload(workload);
		for (const profile of campaign.profiles) builder.profile(profile, profile.slug === campaign.baseline);
	}
	for (const campaign of data.campaigns) builder.settings(campaign);
	const lexicon: Lexicon = new Map();
	for (const alias of builder.aliases.values()) {
		const first = alias.words[0] ?? '';
		lexicon.set(first, [...(lexicon.get(first) ?? []), alias]);
	}
	for (const aliases of lexicon.values()) aliases.sort((a, b) => b.words.length - a.words.length);
	return lexicon;
}

/** Every name of the lexicon in a text, the longest where several begin at one word. */
export function mentionsIn(text: string, lexicon: Lexicon): Mention[] {
	const words = wordsOf(text);
	const found: Mention[] = [];
	for (let index = 0; index < words.length; index += 1) {
		const word = words[index];
		const aliases = word && lexicon.get(word.text);
		if (!aliases) continue;
		const before = words[index - 1]?.text ?? '';
		const alias = aliases.find(
			(one) =>
				(!one.after || one.after.has(before)) &&
				one.words.every((part, step) => {
					const here = words[index + step];
					const last = words[index + step - 1];
					return (
						here?.text === part &&
						(step === 0 || (last && /^[\s\u00a0\-–,]{1,3}$/.test(text.slice(last.to, here.from))))
					);
				})
		);
		if (!alias) continue;
		const last = words[index + alias.words.length - 1] ?? word;
		found.push({ from: word.from, to: last.to, named: alias.named, whole: alias.whole });
		index += alias.words.length - 1;
	}
	return found;
}
