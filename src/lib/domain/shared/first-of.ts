/** Rows with those that are named first, in the order they are named, and the others after them in their own. */
export function firstOf<T extends { slug: string }>(rows: readonly T[], slugs: readonly string[]): T[] {
	const named = slugs.flatMap((slug) => rows.find((row) => row.slug === slug) ?? []);
	return [...named, ...rows.filter((row) => !slugs.includes(row.slug))];
}
