import type { DirectiveToken } from './directive-syntax';
import { allDirectives } from './directives/all-directives';
import { missing, type AnyDirective, type Lookup, type Press, type Printed } from './directives/shape';
import { unknownName } from './names-near';
import { nearest } from '../shared/nearest';

const byName = new Map(allDirectives.map((one) => [one.name, one]));
const names = [...byName.keys()];

const marks = { inline: ':', block: '::', container: ':::' } as const;

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
const fixed = new Set(['kind', 'show', 'topic']);

/**
 * Finds the directive a token names and prints it; else says why not, with the nearest names.
 * @param press everything it is printed from, the call included
 */
export function runDirective(token: DirectiveToken, press: Press): Lookup<Printed> {
	const one = byName.get(token.name);
	if (!one) return unknownName(`There is no directive called “${token.name}”.`, token.name, names);
	if (one.level !== token.level) {
		const where = one.level === 'inline' ? 'stands in a sentence' : 'stands on a line of its own';
		return missing(`“${one.name}” ${where}: write ${marks[one.level]}${one.name}.`, []);
	}
	if (token.fault !== null) return missing(token.fault);
	return attributeProblem(one, press) ?? valueProblem(one, press) ?? one.print(press);
}
