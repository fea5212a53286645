import type { ArticleData } from '../data';
import { ambients, prices, switchPoints } from './other-facts';
import { differences, gains, overalls, readings } from './figure-facts';
import type { Datum, Held } from './datum';
import { lexiconOf, type Lexicon } from './names';
import { methodFacts, settingFacts } from './setting-facts';
import { unitReader, type UnitReader } from './prose-units';

/** Everything the claims of an article are held against, made once for its data. */
export class BenchFacts {
	readonly lexicon: Lexicon;
	readonly units: UnitReader;
	readonly readings: Datum[];
	/** Those of them that are averages, and not spreads. */
	readonly averages: Datum[];
	/** Settings, derived facts, switch points, ambient: what is so, and not how fast. */
	readonly others: Datum[];
	readonly methods: Datum[];
	readonly prices: Datum[];
	private readonly gainsOver = new Map<string | null, Held[]>();
	private readonly differencesOver = new Map<string | null, Datum[]>();
	private readonly overallsOver = new Map<string | null, Held[]>();

	constructor(readonly data: ArticleData) {
		this.lexicon = lexiconOf(data);
		this.units = unitReader(data.campaigns.flatMap((one) => one.workloads.map(({ unit }) => unit)));
		this.readings = readings(data);
		this.averages = this.readings.filter((one) => one.kind === 'reading');
		this.others = [...settingFacts(data), ...switchPoints(data), ...ambients(data)];
		this.methods = methodFacts(data, this.units);
		this.prices = prices(data);
	}

	/** Gains over a profile; over each campaign's baseline for null. */
	gains(over: string | null): Held[] {
		const known = this.gainsOver.get(over) ?? gains(this.data, over);
		this.gainsOver.set(over, known);
		return known;
	}

	/** Averages less those of a profile, in their own unit. */
	differences(over: string | null): Datum[] {
		const known = this.differencesOver.get(over) ?? differences(this.data, this.averages, over);
		this.differencesOver.set(over, known);
		return known;
	}

	overalls(over: string | null): Held[] {
		const known = this.overallsOver.get(over) ?? overalls(this.data, over);
		this.overallsOver.set(over, known);
		return known;
	}
}

const made = new WeakMap<ArticleData, BenchFacts>();

/** The facts of an article's data, kept as long as the data. */
export function benchFacts(data: ArticleData): BenchFacts {
	const known = made.get(data) ?? new BenchFacts(data);
	made.set(data, known);
	return known;
}
