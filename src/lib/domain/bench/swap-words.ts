interface Unit {
	slug: string;
	maker: string;
	model: string;
	kind: string;
}

const named = (unit: Unit): string => `${unit.slug} (${unit.maker} ${unit.model})`;

/**
 * Which samples a revision has that the one before had not, and the other way round, by kind of part.
 * @example swapWords([cooler1], [cooler2]) // ['cooler: m-204 (Brisk Tower 14) out, m-207 (Brisk Tower 14) in']
 */
export function swapWords(before: readonly Unit[], after: readonly Unit[]): string[] {
	const gone = before.filter((unit) => !after.some((other) => other.slug === unit.slug));
	const come = after.filter((unit) => !before.some((other) => other.slug === unit.slug));
	const kinds = [...new Set([...gone, ...come].map((unit) => unit.kind))];
	return kinds.map((kind) => {
		const moves = [
			...gone.filter((unit) => unit.kind === kind).map((unit) => `${named(unit)} out`),
			...come.filter((unit) => unit.kind === kind).map((unit) => `${named(unit)} in`)
		];
		return `${kind.replaceAll('-', ' ')}: ${moves.join(', ')}`;
	});
}
