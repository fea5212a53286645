import { describe, expect, it } from 'vitest';
import type { OwnSetting } from '../profile';
import { inheritance } from './inheritance';

const own = (setting: string, value: string, unit = ''): OwnSetting => ({
	menuPath: 'Tuning',
	setting,
	value,
	unit,
	quantity: unit === 'V' || unit === 'mV' ? 'core-voltage' : 'other',
	note: ''
});

const stock = {
	slug: 'stock',
	name: 'Stock',
	settings: [own('Ratio', '47'), own('Voltage', '1.20', 'V'), own('Fans', 'Auto')]
};
const fixed = { slug: 'fixed', name: 'Fixed', settings: [own('Ratio', '50'), own('Cache', 'On')] };
const further = {
	slug: 'further',
	name: 'Further',
	settings: [own('Ratio', '52'), own('Voltage', '1200', 'mV'), own('Limit', '200')]
};

const names = (line: Parameters<typeof inheritance>[0]) => {
	const { changes, adds, repeats, takesOver } = inheritance(line);
	return {
		changes: changes.map(({ fact, from, setBy }) => `${fact.setting} ${from} → ${fact.value}, ${setBy.slug}`),
		adds: adds.map(({ fact }) => fact.setting),
		repeats: repeats.map(({ fact, setBy }) => `${fact.setting}, ${setBy.slug}`),
		takesOver: takesOver.map(({ fact, setBy }) => `${fact.setting}, ${setBy.slug}`)
	};
};

describe('what a profile changes and takes over', () => {
	it('names who set last what it changes or takes over', () => {
		expect(names([stock, fixed, further])).toEqual({
			changes: ['Ratio 50 → 52, fixed'],
			adds: ['Limit'],
			repeats: ['Voltage, stock'],
			takesOver: ['Fans, stock', 'Cache, fixed']
		});
	});

	it('is all its own for stock, and all taken over for a profile that sets nothing', () => {
		expect(names([stock])).toMatchObject({ adds: ['Ratio', 'Voltage', 'Fans'], takesOver: [] });
		expect(names([stock, { ...fixed, settings: [] }])).toMatchObject({
			changes: [],
			adds: [],
			takesOver: ['Ratio, stock', 'Voltage, stock', 'Fans, stock']
		});
		expect(names([])).toMatchObject({ adds: [] });
	});
});
