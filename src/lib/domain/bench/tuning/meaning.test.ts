import { describe, expect, it } from 'vitest';
import { meaningOf, meant, type MeaningEntry } from './meaning';
import { fact } from './setting-fact.fixture';

// An invented family; the names are nobody's.
const entries: MeaningEntry[] = [
	{ family: 'Plainboard 4', setting: 'Multiplier', quantity: 'core-ratio', coreGroup: 0 },
	{ family: 'Plainboard 4', setting: 'Core group ratio', quantity: 'core-ratio' },
	{ family: 'Plainboard 4', setting: 'Island B multiplier', quantity: 'core-ratio', coreGroup: 2 },
	{ family: 'Plainboard 4', menuPath: 'Memory', setting: 'Multiplier', quantity: 'memory-data-rate' },
	{ family: 'Other', setting: 'Speed', quantity: 'core-clock' }
];
const meaning = (setting: string, menuPath = '', family = 'Plainboard 4') =>
	meaningOf(fact({ setting, menuPath }), family, entries);

describe('what a setting means', () => {
	it('is what the row says itself, before any mapping', () => {
		const row = fact({ setting: 'Multiplier', quantity: 'core-clock' });
		expect(meaningOf(row, 'Plainboard 4', entries)).toEqual({
			quantity: 'core-clock',
			group: null,
			known: 'row'
		});
	});

	it.each(['Multiplier', 'MULTIPLIER', ' multi plier '])('is told by the mapping for %j', (name) => {
		expect(meaning(name)).toEqual({ quantity: 'core-ratio', group: null, known: 'mapping' });
	});

	it('takes the family as it is written, whatever its case', () => {
		expect(meaning('Multiplier', '', 'plainboard4').known).toBe('mapping');
		expect(meaning('Multiplier', '', 'Plainboard 5').known).toBe('unknown');
		expect(meaning('Speed')).toEqual({ quantity: 'other', group: null, known: 'unknown' });
	});

	it('prefers an entry for the very menu', () => {
		expect(meaning('Multiplier', ' memory ').quantity).toBe('memory-data-rate');
		expect(meaning('Multiplier', 'Tuning > Memory').quantity).toBe('core-ratio');
	});

	it.each([
		['Core group 2 ratio', 2],
		['Core Group #12 Ratio', 12],
		['Core group ratio 3', 3],
		['Core group ratio', null]
	])('reads the group of %j', (name, group) => {
		expect(meaning(name)).toEqual({ quantity: 'core-ratio', group, known: 'mapping' });
	});

	it('takes the group from the entry, or from the menu', () => {
		expect(meaning('Island B multiplier').group).toBe(2);
		expect(meaning('Multiplier', 'Tuning > Chiplet 1').group).toBe(1);
		expect(meaning('Multiplier', 'Chiplet 1 > Core group 3').group).toBe(3);
	});

	it('reads no group from other numbers', () => {
		expect(meaning('Slot 2 speed').group).toBeNull();
		expect(meaning('Stage2').group).toBeNull();
	});

	it('is put into the settings, which stay as they were', () => {
		const row = fact({ setting: 'Multiplier', value: '52' });
		expect(meant([row], 'Plainboard 4', entries)).toEqual([
			{ ...row, quantity: 'core-ratio', group: null, known: 'mapping' }
		]);
		expect(row.quantity).toBe('other');
	});
});
