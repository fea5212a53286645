export const costKinds = ['power', 'energy', 'temperature', 'noise'] as const;
/** What a strategy costs beside its price. */
export type CostKind = (typeof costKinds)[number];

export const costWords: Record<CostKind, string> = {
	power: 'power',
	energy: 'energy',
	temperature: 'temperature',
	noise: 'noise'
};

const kinds: [RegExp, CostKind][] = [
	[/^[mk]?w(att)?s?$/, 'power'],
	[/^([mk]?j|[mk]?wh|joules?)$/, 'energy'],
	[/^(°\s*[cf]|℃|℉|k|kelvin)$/, 'temperature'],
	[/^(db\b.*|decibels?|sones?)$/, 'noise']
];

/** Whether a unit is of a cost (power, energy, temperature, noise) and of which; null for a score. @example costOf('W') // 'power' */
export const costOf = (unit: string): CostKind | null =>
	kinds.find(([form]) => form.test(unit.trim().toLowerCase()))?.[1] ?? null;
