import type { DirectiveError } from './render-article';
import { writtenDirectives, type Range, type WrittenDirective } from './written-directives';

/** One change that would put a fault right. */
export interface Mend extends Range {
	/** What it does, such as “Change to tile-render”. */
	words: string;
	insert: string;
}

/** A fault at its place in the source, with what would put it right, nearest first. */
export interface Fault extends Range {
	message: string;
	mends: Mend[];
}

const quotedIn = (message: string): string[] =>
	[...message.matchAll(/“([^”]*)”/g)].map((match) => match[1] ?? '');

/** The value, or the part of a value with commas, that a message quotes. */
function quotedValue({ attributes }: WrittenDirective, quoted: readonly string[]): Range | undefined {
	for (const { value, valueAt } of attributes) {
		let at = valueAt.from;
		for (const part of [value, ...value.split(/(?<=,)/)]) {
			const name = part.replace(/,$/, '');
			if (name !== '' && quoted.includes(name.trim())) return { from: at, to: at + name.length };
			if (part !== value) at += part.length;
		}
	}
	return undefined;
}

/** What of a directive a message is about, and whether another name could take its place. */
function blamed(one: WrittenDirective, message: string): { at: Range; replaced: boolean } {
	const quoted = quotedIn(message);
	if (message.startsWith('There is no directive')) return { at: one.nameAt, replaced: true };
	const value = quotedValue(one, quoted);
	if (value) return { at: value, replaced: true };
	const stranger = one.attributes.find(({ name }) => quoted.includes(name));
	return stranger ? { at: stranger.nameAt, replaced: true } : { at: one, replaced: false };
}

/** Whether an attribute is asked for, and where it would go. */
function lacking(one: WrittenDirective, message: string): { name: string; at: number; lead: string } | null {
	const name = /(?:Add|needs) ([\w-]+)=/.exec(message)?.[1];
	if (name === undefined || !one.inside || !one.closed) return null;
	const empty = one.attributes.length === 0;
	return { name, at: one.inside.to, lead: empty ? '' : ' ' };
}

function mendsOf(one: WrittenDirective, { message, nearest }: DirectiveError): Pick<Fault, 'mends'> & Range {
	const lack = lacking(one, message);
	const { at, replaced } = blamed(one, message);
	const mends = nearest.map((name): Mend =>
		lack
			? {
					from: lack.at,
					to: lack.at,
					words: `Add ${lack.name}=${name}`,
					insert: `${lack.lead}${lack.name}=${name}`
				}
			: { ...at, words: `Change to ${name}`, insert: name }
	);
	return { from: at.from, to: at.to, mends: lack || replaced ? mends : [] };
}

/**
 * Where in a source each error of its page stands, to the name it is about, with the changes that would mend it. What
 * cannot be found again is at its line.
 */
export function faultsOf(source: string, errors: readonly DirectiveError[]): Fault[] {
	if (errors.length === 0) return [];
	const starts = [0];
	for (let at = source.indexOf('\n'); at >= 0; at = source.indexOf('\n', at + 1)) starts.push(at + 1);
	const all = writtenDirectives(source);
	const taken = new Set<WrittenDirective>();
	return errors.map((error) => {
		const from = starts[Math.min(error.line, starts.length) - 1] ?? 0;
		const to = (starts[error.line] ?? source.length + 1) - 1;
		const here = all.filter(
			(one) => one.from >= from && one.from <= to && one.name === error.directive && !taken.has(one)
		);
		const quoted = quotedIn(error.message);
		const one = here.find((each) => quotedValue(each, quoted)) ?? here[0];
		if (!one)
			return { from, to: Math.max(from, Math.min(to, source.length)), message: error.message, mends: [] };
		taken.add(one);
		return { message: error.message, ...mendsOf(one, error) };
	});
}
