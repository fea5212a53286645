import { halfWidthOf, printedGain, printedSigned, withUnit } from '../shared/quantity';
import { costWords } from './cost-of';
import { type Verdict, verdictWords } from './figures';
import type { CostStanding, ProfileTradeOff, Standing, WorkClass } from './trade-off';

export const workWords: Record<WorkClass, string> = {
	'light-threaded': 'light-threaded work',
	'all-core': 'all-core work',
	game: 'games',
	memory: 'memory'
};

/** One sentence on each side of the scales, by what the comparisons say; the list is empty where none speaks. */
export interface TradeOffWords {
	gains: string | null;
	givesUp: string | null;
	same: string | null;
	open: string | null;
}

const gainOf = ({ name, gainPercent, gainCi95 }: Standing): string =>
	gainPercent === null ? name : `${name} ${printedGain(gainPercent, gainCi95)}`;

const costOf = ({ name, more, moreCi95, unit }: CostStanding): string =>
	more === null
		? name
		: `${name} ${withUnit(printedSigned(more, { halfWidth: halfWidthOf(moreCi95) }), unit)}`;

interface Said {
	group: string;
	verdict: Verdict | null;
	words: string;
	name: string;
}

/** A sentence of groups with their workloads; null where no workload has the verdict. */
function sentence(
	head: string,
	said: readonly Said[],
	verdict: Verdict,
	print: (one: Said) => string
): string | null {
	const groups = new Map<string, string[]>();
	for (const one of said) {
		if (one.verdict === verdict) groups.set(one.group, [...(groups.get(one.group) ?? []), print(one)]);
	}
	if (groups.size === 0) return null;
	return `${head}: ${[...groups].map(([group, list]) => `${group} (${list.join(', ')})`).join('; ')}.`;
}

/**
 * What a strategy gains and gives up against the baseline, in words drawn from the verdicts of the comparison alone:
 * a workload is named on a side only where its verdict, corrected with the others, puts it there.
 */
export function tradeOffWords({ classes, costs }: ProfileTradeOff): TradeOffWords {
	const said: Said[] = [
		...classes.flatMap(({ class: kind, of }) =>
			of.map((one) => ({ ...one, group: workWords[kind], words: gainOf(one) }))
		),
		...costs.map((one) => ({ ...one, group: costWords[one.kind], words: costOf(one) }))
	];
	const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
	return {
		gains: sentence('Gains', said, 'better', (one) => one.words),
		givesUp: sentence('Gives up', said, 'worse', (one) => one.words),
		same: sentence(capital(verdictWords['no-difference']), said, 'no-difference', (one) => one.name),
		open: sentence(capital(verdictWords['not-enough']), said, 'not-enough', (one) => one.name)
	};
}
