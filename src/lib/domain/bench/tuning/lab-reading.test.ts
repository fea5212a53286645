import { describe, expect, it } from 'vitest';
import { profileReading, unexplained, type LabKnowledge } from './lab-reading';

const row = (setting: string, value: string, unit: string) => ({
	menuPath: 'Tweaker',
	setting,
	value,
	unit,
	quantity: 'other' as const,
	note: ''
});
const chain = [{ settings: [row('Vcore', '1.20', 'V'), row('Halo', 'Level 2', '')] }];
const changed = [...chain, { settings: [row('Vcore', '1.40', 'V')] }];
const lab: LabKnowledge = {
	family: 'Hollin',
	meanings: [{ family: 'Hollin', setting: 'Vcore', quantity: 'core-voltage' }],
	limits: [
		{ quantity: 'core-voltage', partKind: 'processor', limit: 1.35, unit: 'V', source: 'seen to age' }
	],
	kinds: ['processor']
};

describe('a profile as the lab reads it', () => {
	it('is warned of by a limit that only a meaning ties to its setting', () => {
		expect(profileReading(changed, lab).advice).toMatchObject([
			{ kind: 'over-the-lab-limit', severity: 'warning', settings: ['Vcore'] }
		]);
		expect(profileReading(changed, { ...lab, meanings: [] }).advice).toEqual([]);
		expect(profileReading(changed, { ...lab, kinds: ['memory'] }).advice).toEqual([]);
	});

	it('keeps the values it inherits beside its own', () => {
		expect(profileReading(changed, lab).settings).toMatchObject([
			{ setting: 'Vcore', value: '1.40', stockValue: '1.20', quantity: 'core-voltage', known: 'mapping' },
			{ setting: 'Halo', quantity: 'other', known: 'unknown' }
		]);
	});

	it('asks once for the meaning of each name that nothing explains', () => {
		const rows = changed.flatMap(({ settings }) => settings);
		expect(unexplained(rows, lab)).toEqual(['Halo']);
		expect(unexplained(rows, { family: '', meanings: lab.meanings })).toEqual(['Vcore', 'Halo']);
		expect(unexplained(profileReading(changed, lab).settings, lab)).toEqual(['Halo']);
	});
});
