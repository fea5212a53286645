import type { CellFigures, Overall, WorkloadFacts } from '../bench/figures';
import type { DriftFacts } from '../bench/drift-facts';
import type { LadderFacts } from '../bench/stability/ladder-facts';
import type { SweepFacts } from '../bench/stability/sweep-facts';
import type { Advice } from '../bench/tuning/advice';
import type { SettingQuantity } from '../bench/words';
import type { EmbargoField, PartKind, Provenance } from '../stores/words';
import type { PictureFacts } from './pictures/picture';

/** One setting of a profile, with the value of the stock profile beside it where stock has one. */
export interface SettingFact {
	menuPath: string;
	setting: string;
	value: string;
	unit: string;
	quantity: SettingQuantity;
	note: string;
	/** Value of the same setting in the parent and in stock; null where they leave it alone. */
	parentValue: string | null;
	stockValue: string | null;
}

/** A derived fact of a profile, ready to print: clock, first-word latency, power factor … */
export interface DerivedFact {
	name: string;
	value: number;
	unit: string;
	/** Decimals to print it with. */
	decimals: number;
	/** Printed in the value's place where a number does not say it, such as a ratio of three clocks. */
	text?: string;
	/** The formula in words, for the note under it. */
	how: string;
}

export interface ProfileFacts {
	slug: string;
	name: string;
	/** Null for stock. */
	parent: string | null;
	notes: string;
	/** In menu order, the parent's settings included; what they set as the row or the lab's meanings say. */
	settings: SettingFact[];
	derived: DerivedFact[];
	/** What is worth another look, by the lab's limits among others; left out of editions from before it was told. */
	advice?: Advice[];
}

export interface KitLine {
	part: string;
	partName: string;
	kind: PartKind;
	sample: string;
	provenance: Provenance;
	/** The latest price seen; null where none was recorded. */
	price: { amountMinor: number; currency: string; observedOn: string } | null;
}

export interface CampaignData {
	slug: string;
	name: string;
	rig: { slug: string; name: string; revision: number; firmware: string; driver: string; os: string };
	kit: KitLine[];
	/** In the campaign's order; stock among them when it was measured. */
	profiles: ProfileFacts[];
	workloads: WorkloadFacts[];
	/** The profile the others are held against, usually stock. */
	baseline: string;
	cells: CellFigures[];
	/** By profile slug. */
	overall: Record<string, Overall>;
}

/** A duty that comes with a sample: what must stand under the article, and until when it must wait. */
export interface SampleDuty {
	sample: string;
	partName: string;
	provenance: Provenance;
	/** The text agreed with the partner; null for a bought sample or where none was agreed. */
	disclosure: string | null;
	embargoes: { field: EmbargoField; until: string }[];
}

/** A word of the trade, as the lab explains it to its readers. */
export interface GlossaryTerm {
	slug: string;
	term: string;
	/** In plain text. */
	explanation: string;
	/** Other words it goes by. */
	aliases?: string[];
}

/** Everything an article's directives may name: plain JSON, made on the server, used by the one renderer everywhere. */
export interface ArticleData {
	campaigns: CampaignData[];
	duties: SampleDuty[];
	/** Ladders and sweeps of the rigs of those campaigns; left out of editions from before there were any. */
	ladders?: LadderFacts[];
	sweeps?: SweepFacts[];
	/** Stock of those rigs over time, workload by workload; left out of older editions as well. */
	drifts?: DriftFacts[];
	/** The stored pictures that the text names; one that is in neither list is printed without its size. */
	pictures?: PictureFacts[];
	/** Hashes that the text names and the store does not have. */
	missingPictures?: string[];
	/** The lab's terms; in an edition, those that its page uses. Left out of older editions. */
	glossary?: GlossaryTerm[];
	/** The publication's zone for the dates it prints, such as Europe/Oslo. */
	zone: string;
}
