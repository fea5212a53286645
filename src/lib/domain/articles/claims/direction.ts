import type { Verdict, WorkloadFacts } from '../../bench/figures';
import { verdictWords } from '../../bench/figures';
import { printedGain, printedGainRange, printed, withUnit } from '../../shared/quantity';
import { comparisonOver } from '../against';
import type { CampaignData } from '../data';
import type { BenchFacts } from './bench-facts';
import { front, type Datum } from './datum';
import { judgeCheaper, judgeOverall } from './direction-others';
import { fitsAbout, type Saying } from './direction-words';
import { judged, type Judged } from './judged';
import { linkOf, namedIn, overOf, words, type Link, type Surroundings } from './scope';

/** A claim of direction in a passage. */
export interface Direction {
	from: number;
	to: number;
	judged: Judged;
}

const hedged =
	/\b(?:would|could|might|may|can|should|must|if|whether|unless|to be|want|need|hope|expect|said to|seems?|supposed|perhaps|likely|had|make it|why)\b[^,;.]*$/i;
const attributive =
	/^(?: \p{Ll}+ly)? (?!than|in|on|at|for|under|with|over|by|and|but|or|here|there|again|too|still|as|when|while|where|because|since|so|now|either|overall|from|to|everywhere|than|yet|if|after|before|even|only|during|through|throughout|that|this|these|power|energy|time|everything|nothing|the|our|a|an)\p{Ll}{3,}/u;

/** The verdict of a cell, whether it is held by ratio or by difference, and its datum. */
function verdictOf(
	campaign: CampaignData,
	workload: WorkloadFacts,
	profile: string,
	over: string
): { verdict: Verdict; datum: Datum } | null {
	const named = campaign.profiles.find((one) => one.slug === profile);
	const against = campaign.profiles.find((one) => one.slug === over);
	if (!named || !against) return null;
	const base = {
		campaign: campaign.slug,
		workload: workload.slug,
		profile,
		over,
		called: null,
		name: `${workload.name}, ${front(named.name)}${over === campaign.baseline ? '' : ` over ${front(against.name)}`}`
	};
	const comparison = comparisonOver(campaign, workload, profile, over);
	if (comparison) {
		const { gainPercent, gainCi95, verdict } = comparison;
		const range = gainCi95 && printedGainRange(gainCi95);
		return {
			verdict,
			datum: {
				...base,
				kind: 'gain',
				value: gainPercent,
				unit: '%',
				interval: gainCi95,
				printed: printedGain(gainPercent, gainCi95),
				range
			}
		};
	}
	const held =
		over === campaign.baseline
			? campaign.cells.find((one) => one.profile === profile && one.workload === workload.slug)?.difference
			: null;
	if (!held) return null;
	const raw = workload.better === 'lower' ? -held.difference : held.difference;
	const text = withUnit(
		printed(raw, { halfWidth: held.ci95 ? (held.ci95[1] - held.ci95[0]) / 2 : null }),
		workload.unit
	);
	return {
		verdict: held.verdict,
		datum: {
			...base,
			kind: 'difference',
			value: raw,
			unit: workload.unit,
			interval: null,
			printed: text,
			range: null
		}
	};
}

/** What a saying expects of a verdict, in the workload's own direction. */
function expected(
	{ way }: Saying,
	workload: WorkloadFacts
): 'better' | 'worse' | 'same' | 'not-better' | 'not-worse' {
	if (way === 'lower') return workload.better === 'lower' ? 'better' : 'worse';
	if (way === 'higher') return workload.better === 'higher' ? 'better' : 'worse';
	return way;
}

const opposite: Record<string, string> = { better: 'worse', worse: 'better' };

/** A direction held against a verdict. */
function held(said: ReturnType<typeof expected>, verdict: Verdict, datum: Datum): Judged {
	const name = verdictWords[verdict];
	const stands = `${name.charAt(0).toUpperCase()}${name.slice(1)}.`;
	if (said === 'better' || said === 'worse') {
		if (verdict === said) return judged('agrees', datum, stands);
		if (verdict === opposite[said]) return judged('contradicts', datum, `It goes the other way: ${name}.`);
		return judged('more-than-data', datum, stands);
	}
	if (said === 'not-better') {
		if (verdict === 'better') return judged('contradicts', datum, `There is a gain: ${name}.`);
		return verdict === 'not-enough'
			? judged('more-than-data', datum, stands)
			: judged('agrees', datum, stands);
	}
	if (said === 'not-worse') {
		if (verdict === 'worse') return judged('contradicts', datum, `There is a loss: ${name}.`);
		return verdict === 'not-enough'
			? judged('more-than-data', datum, stands)
			: judged('agrees', datum, stands);
	}
	if (verdict === 'no-difference') return judged('agrees', datum, stands);
	if (verdict === 'not-enough') return judged('more-than-data', datum, stands);
	return judged('contradicts', datum, `There is a difference: ${name}.`);
}

const rank = { contradicts: 0, 'more-than-data': 1, agrees: 2, 'not-backed': 3, bound: 4 } as const;

/** A workload that a saying is about where its sentence names none: the only one it can be said of. */
function onlyFor({ data }: BenchFacts, about: Saying['about']): string[] {
	if (about === 'any' || about === 'speed') return [];
	const slugs = [
		...new Set(
			data.campaigns.flatMap((one) =>
				one.workloads.filter((workload) => fitsAbout(workload, about)).map(({ slug }) => slug)
			)
		)
	];
	return slugs.length === 1 ? slugs : [];
}

function negated(text: string, from: number, said: string): boolean {
	return (
		/^(?:no|not|not any|never) (?=faster|quicker|slower|cooler|hotter|warmer|quieter|louder|better|worse|more|less|lower|higher|longer|shorter)/i.test(
			said
		) ||
		/(?:\bnot|\bno|\bnever|n[’']t|\bneither|\bhardly|\bnowhere)(?: (?:any|get|become|run|be|make it|really|even))*\s*$/i.test(
			text.slice(Math.max(0, from - 30), from)
		)
	);
}
const turned: Partial<Record<Saying['way'], Saying['way']>> = { better: 'not-better', worse: 'not-worse' };

/** The workloads a saying is about: those named near it of which it can be said, else the only one there is. */
function workloadsOf({ about }: Saying, s: Surroundings, facts: BenchFacts, profile: Link): string[] {
	const link = linkOf('workload', s);
	const sayable = (slugs: string[]) =>
		slugs.filter((slug) =>
			facts.data.campaigns.some((one) =>
				one.workloads.some((workload) => workload.slug === slug && fitsAbout(workload, about))
			)
		);
	const named = sayable(link.slugs);
	if (named.length > 0 && (link.hold === 'clause' || link.hold === 'sentence')) return named;
	const near = sayable(namedIn(s, 'workload'));
	if (near.length === 1) return near;
	const only = onlyFor(facts, about);
	if (only.length > 0) return only;
	return link.hold === 'context' && profile.hold === 'clause' ? named : [];
}

/** What stands before “cooler” where it compares. */
const saidOf =
	/\b(?:is|are|was|were|be|gets?|got|runs?|ran|stays?|stayed|sits?|keeps?|kept|comes?|it|core|degrees|K|°C|rig|card|and|but)(?: (?:now|then|also|still|all|in fact))*\s*$/i;

/** Judges one saying; null where nothing says of what it is said. */
export function judgeDirection(
	found: { from: number; to: number; saying: Saying },
	s: Surroundings,
	facts: BenchFacts
): Judged | null {
	const { from, to } = found;
	const text = words(s.passage.text);
	if (text.slice(s.sentence.from, s.sentence.to).trimEnd().endsWith('?')) return null;
	if (hedged.test(text.slice(Math.max(s.clause.from, from - 160), from))) return null;
	if (
		found.saying.way !== 'same' &&
		!/nothing|^no /i.test(text.slice(from, to)) &&
		attributive.test(text.slice(to, to + 24))
	)
		return null;
	if (
		/\b(?:the|a|an|any|whichever|higher is|lower is|more is|less is)\s*$/i.test(
			text.slice(Math.max(0, from - 12), from)
		) &&
		found.saying.way !== 'same'
	)
		return null;
	const before = text.slice(Math.max(s.sentence.from, from - 300), from);
	// A cooler is a part as often as it is a comparison; and “a machine that …” is no machine of ours.
	if (/cooler$/i.test(text.slice(from, to)) && !saidOf.test(before)) return null;
	if (/^\s*(?:An?|Any|Whoever|Whatever)\s+\p{Ll}+\s+(?:that|which|who|with)\b/u.test(before)) return null;
	if (found.saying.about === 'price') return judgeCheaper(found.saying, s, facts);
	const profile = linkOf('profile', s);
	const slugs = workloadsOf(found.saying, s, facts, profile);
	const is = negated(text, from, text.slice(from, to));
	if (slugs.length === 0) return is ? null : judgeOverall(found.saying, s, facts);
	const over = overOf(s);
	const verdicts = facts.data.campaigns.flatMap((campaign) =>
		campaign.workloads
			.filter((workload) => slugs.includes(workload.slug) && fitsAbout(workload, found.saying.about))
			.flatMap((workload) => {
				const base =
					over.find((slug) => campaign.profiles.some((one) => one.slug === slug)) ?? campaign.baseline;
				// What stock does by itself is held against nothing.
				const onlyBase = profile.slugs.length > 0 && profile.slugs.every((slug) => slug === base);
				if (onlyBase && found.saying.way !== 'same') return [];
				const named =
					[profile.slugs, namedIn(s, 'profile')]
						.map((some) => some.filter((slug) => slug !== base))
						.find((some) => some.length > 0) ?? [];
				const profiles =
					named.length > 0
						? named
						: profile.hold === 'none' || profile.hold === 'heading'
							? campaign.profiles.map((one) => one.slug)
							: [];
				return profiles.flatMap((slug) => {
					const result = verdictOf(campaign, workload, slug, base);
					if (!result) return [];
					const plain = expected(found.saying, workload);
					return [
						held(
							is ? ((turned[plain as Saying['way']] as typeof plain | undefined) ?? plain) : plain,
							result.verdict,
							result.datum
						)
					];
				});
			})
	);
	// A name that stands for several profiles is right if any of them is meant, unless all are.
	const [best] = verdicts.sort((a, b) => rank[b.state] - rank[a.state]);
	const worst = verdicts.at(-1);
	const everyone = /\b(?:every|all|each|both|always|any|whatever|no (?:way|profile|setting))\b/i.test(
		text.slice(s.clause.from, from)
	);
	return (everyone ? worst : best) ?? null;
}
