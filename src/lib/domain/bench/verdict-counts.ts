import { verdicts, verdictWords, type Verdict } from './figures';

/**
 * What the comparisons of several workloads say together, in words: the one verdict where they agree, else how many
 * say what. Nulls, where nothing could be compared, are passed over.
 * @example verdictCounts(['better', 'better', 'no-difference']) // 'better in 2 of 3, no difference that matters in 1'
 */
export function verdictCounts(of: readonly (Verdict | null)[]): string {
	const said = of.filter((verdict) => verdict !== null);
	const counts = verdicts
		.map((verdict) => ({ verdict, n: said.filter((one) => one === verdict).length }))
		.filter(({ n }) => n > 0);
	const [first] = counts;
	if (!first) return 'nothing to compare';
	if (counts.length === 1)
		return said.length === 1
			? verdictWords[first.verdict]
			: `${verdictWords[first.verdict]} in all ${said.length}`;
	return counts
		.map(({ verdict, n }, at) => `${verdictWords[verdict]} in ${n}${at === 0 ? ` of ${said.length}` : ''}`)
		.join(', ');
}
