export const partKinds = [
	'processor',
	'board',
	'memory',
	'cooler',
	'graphics',
	'storage',
	'power-supply',
	'case',
	'other'
] as const;
export type PartKind = (typeof partKinds)[number];

export const provenances = ['bought', 'loaned', 'given', 'pre-production'] as const;
export type Provenance = (typeof provenances)[number];

export const loanStages = [
	'asked-for',
	'promised',
	'in-transit',
	'here',
	'going-back',
	'returned',
	'kept',
	'lost'
] as const;
export type LoanStage = (typeof loanStages)[number];

/** What an embargo holds back: what the maker says of the part, what we measured, or both. */
export const embargoFields = ['specification', 'results', 'everything'] as const;
export type EmbargoField = (typeof embargoFields)[number];
