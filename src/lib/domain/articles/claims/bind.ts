import type { ArticleData } from '../data';
import type { DirectiveToken } from '../directive-syntax';
import { alone, runDirective } from '../run-directive';
import type { Datum } from './datum';
import type { Figure } from './figures';

/** A directive that can stand in the place of a claim's text. */
export interface Binding {
	/** What to write. */
	source: string;
	/** What it prints. */
	prints: string;
	/** Whether that is what stands there now, whatever kind of blank is between number and unit. */
	same: boolean;
}

/** A text for comparing: one kind of blank, one minus. */
const plain = (text: string): string =>
	text
		.replace(/[\u00a0\u2007\u2009\u202f]/g, ' ')
		.replace(/-/g, '\u2212')
		.trim();

const written = (name: string, attributes: Record<string, string>): string =>
	`:${name}{${Object.entries(attributes)
		.map(([key, value]) => `${key}=${/^[\w.-]+$/.test(value) ? value : `"${value}"`}`)
		.join(' ')}}`;

function print(name: string, attributes: Record<string, string>, data: ArticleData): string | null {
	const token: DirectiveToken = {
		type: 'directive-inline',
		level: 'inline',
		raw: '',
		name,
		attributes,
		fault: null
	};
	const result = runDirective(token, {
		data,
		draw: () => '',
		call: { name, attributes, line: 1 },
		platesAt: '',
		...alone
	});
	return result.ok ? result.value.plain : null;
}

/** The directives that can print a datum, those that show more of it last. */
function candidates(datum: Datum, figure: Figure | null): [string, Record<string, string>][] {
	const { workload, profile, over } = datum;
	if (profile === null) return [];
	const wants = figure?.quantity.kind;
	const interval = figure?.high ? ['interval'] : [];
	switch (datum.kind) {
		case 'reading':
			return workload === null
				? []
				: ['', ...interval, 'mean', 'median'].map((show) => [
						'reading',
						{ workload, profile, ...(show ? { show } : {}) }
					]);
		case 'gain':
		case 'overall': {
			const shows =
				figure === null
					? ['words', '', 'size']
					: wants === 'times'
						? ['ratio', 'words']
						: [...interval, 'size', ''];
			const base = {
				...(workload === null ? {} : { workload }),
				profile,
				...(over === null ? {} : { over })
			};
			return shows.map((show) => [
				datum.kind === 'gain' ? 'gain' : 'overall',
				{ ...base, ...(show ? { show } : {}) }
			]);
		}
		default:
			return [];
	}
}

/** Leaves out what goes without saying: the baseline, and the campaign where only one has these names. */
function shortest(
	name: string,
	attributes: Record<string, string>,
	datum: Datum,
	data: ArticleData
): { source: string; prints: string } | null {
	const { over, ...without } = attributes;
	const campaign = data.campaigns.find((one) => one.slug === datum.campaign);
	const bare = over === campaign?.baseline ? without : attributes;
	for (const tried of [bare, { ...bare, campaign: datum.campaign }]) {
		const prints = print(name, tried, data);
		if (prints !== null) return { source: written(name, tried), prints };
	}
	return null;
}

type Printing = Omit<Binding, 'same'>;
const printings = new WeakMap<ArticleData, Map<string, Printing[]>>();

/** What the directives of a datum print, each once, kept as long as the data. */
function printingsOf(datum: Datum, figure: Figure | null, data: ArticleData): Printing[] {
	const known = printings.get(data) ?? new Map<string, Printing[]>();
	printings.set(data, known);
	const { kind, campaign, workload, profile, over } = datum;
	const key = [kind, campaign, workload, profile, over, figure?.quantity.kind, figure?.high !== null].join(
		'/'
	);
	const before = known.get(key);
	if (before) return before;
	const found = new Map<string, Printing>();
	for (const [name, attributes] of candidates(datum, figure)) {
		const one = shortest(name, attributes, datum, data);
		if (one && !found.has(one.prints)) found.set(one.prints, one);
	}
	known.set(key, [...found.values()]);
	return [...found.values()];
}

/**
 * What can be written in the place of a claim, each with what it prints: first what prints the same, then the rest as
 * a choice.
 * @param text what stands there now
 * @param figure null for a claim of direction
 */
export const bindingsOf = (datum: Datum, text: string, figure: Figure | null, data: ArticleData): Binding[] =>
	printingsOf(datum, figure, data)
		.map((one) => ({ ...one, same: plain(one.prints) === plain(text) }))
		.sort((a, b) => Number(b.same) - Number(a.same))
		.slice(0, 3);
