import type { PartKind, Provenance } from '$lib/domain/stores/words';

/** Kinds of parts as they are printed in lists. */
export const kindWords: Record<PartKind, string> = {
	processor: 'processor',
	board: 'board',
	memory: 'memory',
	cooler: 'cooler',
	graphics: 'graphics card',
	storage: 'storage',
	'power-supply': 'power supply',
	case: 'case',
	other: 'other'
};

export const provenanceWords: Record<Provenance, string> = {
	bought: 'bought',
	loaned: 'on loan',
	given: 'given',
	'pre-production': 'pre-production'
};

const optionsOf = <K extends string>(words: Record<K, string>) =>
	(Object.entries(words) as [K, string][]).map(([value, label]) => ({ value, label }));

export const kindOptions = optionsOf(kindWords);
export const provenanceOptions = optionsOf(provenanceWords);
