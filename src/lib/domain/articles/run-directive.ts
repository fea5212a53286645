import type { DirectiveToken } from './directive-syntax';
import { allDirectives } from './directives/all-directives';
import { missing, type AnyDirective, type Lookup, type Press, type Printed } from './directives/shape';
import { unknownName } from './names-near';
import { nearest } from '../shared/nearest';

const byName = new Map(allDirectives.map((one) => [one.name, one]));
const names = [...byName.keys()];

/** Attributes it does not know, lacks, or was given another value for than it takes. */
function attributeProblem(one: AnyDirective, { call, data }: Press): ReturnType<typeof missing> | null {
	const known = one.attributes.map((attribute) => attribute.name);
	const stranger = Object.keys(call.attributes).find((name) => !known.includes(name));
	if (stranger !== undefined) {
		return unknownName(`“${one.name}” has no attribute called “${stranger}”.`, stranger, known);
	}
	for (const { name, required, words, values } of one.attributes) {
		const value = call.attributes[name];
		if (required && (value === undefined || value === '' || value === name)) {
			return missing(
				`“${one.name}” needs ${name}= (${words}).`,
				[...(values(data, call.attributes) ?? [])].slice(0, 5)
			);
		}
	}
	return null;
}

/** Fixed lists of values, such as kinds and topics, are held against here; names of data by each directive. */
function valueProblem(one: AnyDirective, { call, data }: Press): ReturnType<typeof missing> | null {
	for (const { name, values } of one.attributes) {
		const value = call.attributes[name];
		const allowed = fixed.has(name) ? values(data, call.attributes) : null;
		if (value !== undefined && allowed && !allowed.includes(value)) {
			return missing(
				`“${value}” is no ${name} of “${one.name}”. It can be ${allowed.join(', ')}.`,
				nearest(value, allowed)
			);
		}
	}
	return null;
}
const fixed = new Set(['kind', 'show', 'topic', 'depth', 'columns']);

/** How a directive of each level is written, for one that was written otherwise. */
const manner = {
	inline: (name: string) => `“${name}” stands in a sentence: write :${name}.`,
	block: (name: string) => `“${name}” stands on a line of its own: write ::${name}.`,
	container: (name: string) =>
		`“${name}” stands around text: write :::${name}, then the text, then ::: on a line of its own.`
} as const;

/** Why a directive cannot stand where it does; null where it can. */
function placeProblem(one: AnyDirective, around: DirectiveToken | null): ReturnType<typeof missing> | null {
	if (one.within !== undefined && around?.name !== one.within) {
		return missing(
			`“${one.name}” makes sense in “${one.within}” alone: put it between :::${one.within} and :::.`
		);
	}
	if (one.level === 'inline' || !around) return null;
	const holds = byName.get(around.name)?.holds;
	if (!holds || holds.includes(one.name)) return null;
	const may = holds.length > 0 ? ` It may hold ${holds.join(', ')}.` : ' It holds text alone.';
	return missing(`“${one.name}” cannot stand in “${around.name}”.${may}`, []);
}

/** What surrounds a directive that stands on no page, such as one printed to see how it reads. */
export const alone = {
	inside: null,
	headings: [],
	termsSoFar: new Set(),
	step: 0
} as const satisfies Partial<Press>;

/**
 * Finds the directive a token names and prints it; else says why not, with the nearest names.
 * @param press everything it is printed from, the call included
 * @param around the container it stands in; null for the page itself
 */
export function runDirective(
	token: DirectiveToken,
	press: Press,
	around: DirectiveToken | null = null
): Lookup<Printed> {
	const one = byName.get(token.name);
	if (!one) return unknownName(`There is no directive called “${token.name}”.`, token.name, names);
	if (one.level !== token.level) return missing(manner[one.level](one.name), []);
	if (token.fault !== null) return missing(token.fault);
	return (
		placeProblem(one, around) ?? attributeProblem(one, press) ?? valueProblem(one, press) ?? one.print(press)
	);
}

/** Whether a directive waits until the rest of the page is known. */
export const isLate = ({ name }: DirectiveToken): boolean => byName.get(name)?.late ?? false;
