import type { AnyDirective } from '../../../domain/articles/directives/shape';

const marks = { inline: ':', block: '::', container: ':::' } as const;
const bare = /^[^\s"'{}]+$/;

const written = (value: string): string => (bare.test(value) ? value : `"${value.replace(/["{}\n]/g, '')}"`);

/**
 * A directive as it stands in a source, with the attributes that were given, in its own order.
 * @example writtenDirective(gain, { workload: 'tile-render', profile: 'fixed-495' }) // ':gain{workload=tile-render profile=fixed-495}'
 */
export function writtenDirective(one: AnyDirective, values: Record<string, string>): string {
	const given = one.attributes
		.map(({ name }) => [name, values[name] ?? ''] as const)
		.filter(([, value]) => value !== '')
		.map(([name, value]) => `${name}=${written(value)}`);
	const head = `${marks[one.level]}${one.name}`;
	// In a sentence the braces are what makes it a directive.
	const braces = given.length > 0 || one.level === 'inline' ? `{${given.join(' ')}}` : '';
	return one.level === 'container' ? `${head}${braces}\n${one.sample ?? ''}\n:::` : head + braces;
}
