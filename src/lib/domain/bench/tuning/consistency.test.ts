import { expect, it } from 'vitest';
import { consistency } from './consistency';
import { fact } from './setting-fact.fixture';

const settings = [
	fact({ setting: 'Data rate', quantity: 'memory-data-rate', unit: 'MT/s', value: '6000' }),
	fact({ setting: 'Fabric', quantity: 'fabric-clock', unit: 'MHz', value: '2000' }),
	fact({ setting: 'Core voltage', quantity: 'core-voltage', unit: 'V', value: '1.4' })
];
const limit = {
	quantity: 'core-voltage',
	partKind: 'processor',
	limit: 1.3,
	unit: 'V',
	source: 'ours'
} as const;

it('puts warnings before advice', () => {
	expect(consistency(settings, [limit], ['processor']).map(({ kind }) => kind)).toEqual([
		'over-the-lab-limit',
		'fabric-not-in-step'
	]);
	expect(consistency(settings, [limit], ['memory']).map(({ kind }) => kind)).toEqual(['fabric-not-in-step']);
});

it('has nothing to say of nothing, and never says safe', () => {
	expect(consistency([])).toEqual([]);
	expect(JSON.stringify(consistency(settings, [limit]))).not.toMatch(/\bsafe/i);
});
