import { printedRatio } from '../../shared/quantity';
import type { Held } from './datum';
import { agrees, roundsTo, type Decimal, type Hedge } from './decimal';
import { clearlyMeant, gaining, judged, nearestTo, tiers, type Case, type Judged } from './judged';
import { words } from './scope';

/** What a multiple is a multiple of. */
interface Multiple {
	/** The speed or score; the quantity itself, such as the time; or either. */
	of: 'rate' | 'quantity' | null;
	/** Said as *faster*, which readers take in two ways. */
	faster: boolean;
	/** A share more or less, as in “a third faster”: the multiple is one plus or minus it. */
	more: 1 | -1 | null;
	/** Turned over: “twice as slow”. */
	turned: boolean;
}

const nouns: [RegExp, Multiple['of']][] = [
	[
		/\b(?:time|times|duration|seconds|power|watts|draw|energy|joules|noise|sone|heat|latency|temperature|long|loud|hot|quiet|cool)\b/i,
		'quantity'
	],
	[
		/\b(?:fast|quick|quickly|speed|rate|rates|frames?|throughput|bandwidth|performance|events|score|pace|good)\b/i,
		'rate'
	]
];

function multipleOf({ figure, s }: Case): Multiple {
	const text = words(s.passage.text);
	const after = text.slice(figure.to, Math.min(figure.to + 40, s.clause.to)).trimStart();
	const before = text.slice(s.clause.from, figure.from);
	const plain = { faster: false, more: null, turned: false };
	if (figure.word?.kind === 'part') {
		const more = /^(?:faster|quicker|more|longer|higher|louder|hotter|better|again)/i.test(after);
		const less =
			/^(?:slower|less|shorter|lower|cooler|quieter|worse|off)/i.test(after) ||
			/\bby(?: about| nearly| almost| over)?\s*$/i.test(before);
		const rate = /^(?:faster|quicker|slower|better|worse)/i.test(after);
		if (more || less) return { ...plain, of: rate ? 'rate' : 'quantity', more: more ? 1 : -1 };
	}
	if (/^(?:faster|quicker|better|more efficient)/i.test(after)) return { ...plain, of: 'rate', faster: true };
	if (/^(?:slower|worse)/i.test(after)) return { ...plain, of: 'rate', faster: true, turned: true };
	if (/^as (?:slow|slowly)\b/i.test(after)) return { ...plain, of: 'rate', turned: true };
	const near = nouns.find(([pattern]) => pattern.test(after.slice(0, 24)));
	if (near) return { ...plain, of: near[1] };
	const far = nouns.find(([pattern]) => pattern.test(before.slice(-40)));
	return { ...plain, of: figure.word?.verb || figure.word?.kind === 'part' ? (far?.[1] ?? null) : null };
}

/** A word has no digits to round to: it agrees within what “about” allows. */
const near = (stored: number, printed: Decimal, hedge: Hedge, isWord: boolean): boolean =>
	agrees(stored, printed, isWord && hedge === null ? 'about' : hedge);

const valuesOf = (one: Held, { of, turned }: Multiple): number[] => {
	const rate = turned ? 1 / one.ratio : one.ratio;
	if (of === 'rate') return [rate];
	return of === 'quantity' ? [one.quotient] : [rate, one.quotient];
};

/** “1.25 times faster” means 1.25 times as fast to some (Patterson and Hennessy define it so) and 2.25 times to others. */
function fasterWhy(printed: Decimal): string {
	const said = printed.text;
	return `“${said} times faster” can be read as ${said} times as fast, or as ${printedRatio(1 + printed.value)} times. Write “times as fast”, or the gain in percent.`;
}

/** A multiple held against the ratios of gains. */
export function judgeTimes(given: Case): Judged {
	const of = gaining(given);
	const { figure, facts, over } = of;
	const [said] = figure.readings;
	if (!said) return judged('not-backed');
	const multiple = multipleOf(of);
	const isWord = figure.word !== null;
	const value = multiple.more === null ? said.value : 1 + multiple.more * said.value;
	const printed: Decimal = multiple.more === null ? said : { text: String(value), places: 2, value };
	const why = multiple.faster ? fasterWhy(said) : '';
	const trap = multiple.faster ? ('times-faster' as const) : null;
	const setting = facts.others.find(
		(one) =>
			one.unit.startsWith('×') &&
			roundsTo(one.value, said) &&
			(of.settings.names.includes(one.called ?? '') || of.profile.slugs.includes(one.profile ?? ''))
	);
	if (setting && !multiple.faster && multiple.of !== 'rate') return judged('agrees', setting);
	const all = over.flatMap((one) => [
		...facts.gains(one),
		...(of.workload.hold === 'clause' ? [] : facts.overalls(one))
	]);
	const placeless = isWord && (of.workload.hold === 'none' || of.workload.hold === 'heading');
	const found = placeless ? [[]] : tiers(all, of);
	const [meant = []] = found;
	for (const pool of found) {
		const match = pool.find((one) =>
			valuesOf(one, multiple).some((ratio) => near(ratio, printed, figure.hedge, isWord))
		);
		if (match) return judged('agrees', match, why, trap);
		const added = multiple.faster
			? pool.find((one) =>
					valuesOf(one, multiple).some((ratio) =>
						near(ratio, { ...printed, value: 1 + printed.value }, figure.hedge, isWord)
					)
				)
			: null;
		if (added) return judged('agrees', added, why, trap);
		if (of.workload.hold === 'clause' && of.profile.hold === 'clause') break;
	}
	const measured = meant.filter((one) => one.kind === 'gain');
	const nearest = nearestTo(measured, printed.value, (one) => valuesOf(one, multiple)[0] ?? 0);
	// A word such as “twice” is as often a manner of speaking: only what the sentence itself names can be wrong.
	const spoken = isWord && !['clause', 'sentence'].includes(of.profile.hold);
	const clear = nearest && !spoken && (multiple.of !== null || !isWord) && clearlyMeant(of, measured);
	const stored = nearest ? `That is ${printedRatio(valuesOf(nearest, multiple)[0] ?? 1)} times.` : '';
	return judged(clear ? 'contradicts' : 'not-backed', nearest, [stored, why].filter(Boolean).join(' '), trap);
}
