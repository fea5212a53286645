import type { PartKind, Provenance } from './words';

export const partKindWords: Record<PartKind, { one: string; many: string }> = {
	processor: { one: 'Processor', many: 'Processors' },
	board: { one: 'Board', many: 'Boards' },
	memory: { one: 'Memory kit', many: 'Memory kits' },
	cooler: { one: 'Cooler', many: 'Coolers' },
	graphics: { one: 'Graphics card', many: 'Graphics cards' },
	storage: { one: 'Drive', many: 'Drives' },
	'power-supply': { one: 'Power supply', many: 'Power supplies' },
	case: { one: 'Case', many: 'Cases' },
	other: { one: 'Other part', many: 'Other parts' }
};

export const provenanceWords: Record<Provenance, string> = {
	bought: 'bought',
	loaned: 'on loan',
	given: 'given',
	'pre-production': 'pre-production'
};
