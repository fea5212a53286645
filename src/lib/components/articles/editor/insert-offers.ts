import type { ArticleData } from '../../../domain/articles/data';
import { allDirectives } from '../../../domain/articles/directives/all-directives';
import type { AnyDirective } from '../../../domain/articles/directives/shape';
import { nameInWords } from '../../../domain/articles/names-in-words';
import type { DirectiveError } from '../../../domain/articles/render-article';

/** Something that can be inserted: a directive with what it is about, filled in from the article's data. */
export interface Offer {
	id: string;
	name: string;
	words: string;
	one: AnyDirective;
	values: Record<string, string>;
}

const names: Record<string, string> = {
	reading: 'Reading',
	gain: 'Gain',
	overall: 'Overall gain',
	plate: 'Plate',
	results: 'Results',
	kit: 'Kit',
	steps: 'Steps',
	caution: 'Caution',
	disclosure: 'Disclosure',
	term: 'Term',
	tradeoffs: 'Trade-offs',
	verdict: 'Verdict',
	tested: 'What we tested',
	step: 'Step card',
	contents: 'Contents',
	note: 'Side note',
	pull: 'Pull quote',
	compare: 'Comparison',
	gallery: 'Gallery',
	source: 'From elsewhere'
};

const sentence = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1).replace(/-/g, ' ');

/** A value to begin with: of profiles one that was tuned, of the rest the first. */
function firstValue(
	one: AnyDirective,
	name: string,
	data: ArticleData,
	given: Record<string, string>
): string {
	const values = one.attributes.find((attribute) => attribute.name === name)?.values(data, given) ?? [];
	const baselines = new Set(data.campaigns.map(({ baseline }) => baseline));
	const tuned = name === 'profile' ? values.find((value) => !baselines.has(value)) : undefined;
	return tuned ?? values[0] ?? '';
}

function filled(one: AnyDirective, given: Record<string, string>, data: ArticleData): Record<string, string> {
	const values = { ...given };
	for (const { name, required } of one.attributes)
		if (required && values[name] === undefined) values[name] = firstValue(one, name, data, values);
	return values;
}

/** Everything that can be inserted, a plate of each kind on its own. */
export function offersOf(data: ArticleData): Offer[] {
	return allDirectives
		.filter((one) => (one as { within?: string }).within === undefined)
		.flatMap((one): Offer[] => {
			const name = names[one.name] ?? sentence(one.name);
			const kinds = one.attributes.find((attribute) => attribute.name === 'kind')?.values(data, {}) ?? null;
			if (!kinds) return [{ id: one.name, name, words: one.words, one, values: filled(one, {}, data) }];
			return kinds.map((kind) => ({
				id: `${one.name}-${kind}`,
				name: `${name}: ${kind.replace(/-/g, ' ')}`,
				words: nameInWords('kind', kind, data) || one.words,
				one,
				values: filled(one, { kind }, data)
			}));
		});
}

/**
 * The values that a first attempt lacked, as its error asks for them: “Add rig= and workload= to say which”.
 * Null where the error asks for nothing that can be given.
 */
export function withWhatLacks(
	{ one, values }: Offer,
	{ message, nearest }: DirectiveError,
	data: ArticleData
): Record<string, string> | null {
	const asked = [...message.matchAll(/\b([\w-]+)=|needs an? ([\w-]+)/g)].map(
		(match) => match[1] ?? match[2] ?? ''
	);
	const lacking = asked.filter((name) => values[name] === undefined);
	if (lacking.length === 0) return null;
	const more = { ...values };
	for (const name of lacking) {
		const value = (asked.length === 1 ? nearest[0] : undefined) ?? firstValue(one, name, data, more);
		if (value === '') return null;
		more[name] = value;
	}
	return more;
}
