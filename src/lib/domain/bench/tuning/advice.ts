export type AdviceKind =
	| 'controller-not-in-step'
	| 'fabric-not-in-step'
	| 'timings-out-of-order'
	| 'over-the-lab-limit'
	| 'limit-not-told'
	| 'boost-left-on'
	| 'set-twice'
	| 'not-understood';

/** Something about a profile that its tester may want to look at again. It never says that the rest is in order. */
export interface Advice {
	kind: AdviceKind;
	/** A warning is about a limit of the lab; all else is advice. */
	severity: 'advice' | 'warning';
	/** One or two plain sentences, ready to print. */
	words: string;
	/** Names of the settings it is about. */
	settings: string[];
	/** Where the rule comes from. */
	source: string;
}

/** For rules of the trade that no standard or publication was found for. */
export const practice = 'common practice, no source';
