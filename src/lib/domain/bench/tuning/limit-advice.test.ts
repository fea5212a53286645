import { describe, expect, it } from 'vitest';
import { limitAdvice, type LabLimit } from './limit-advice';
import { fact } from './setting-fact.fixture';

// The lab's own table is whatever the lab writes; these are invented.
const limits: LabLimit[] = [
	{
		quantity: 'core-voltage',
		partKind: 'processor',
		limit: 1350,
		unit: 'mV',
		source: 'two parts lost in May'
	},
	{ quantity: 'core-voltage', partKind: 'graphics', limit: 1.1, unit: 'V', source: 'board’s sheet' },
	{ quantity: 'power-limit', partKind: 'other', limit: 250, unit: 'W', source: 'the loop' }
];
const volts = (value: string, unit = 'V') =>
	fact({ setting: 'Core voltage', quantity: 'core-voltage', unit, value });
const kinds = (settings: Parameters<typeof limitAdvice>[0]) =>
	limitAdvice(settings, limits, ['processor', 'memory']).map(({ kind }) => kind);

describe('the lab’s own limits', () => {
	it.each([['1.351'], ['1.4 V'], ['1400 mV']])('are passed by %s', (value) => {
		expect(kinds([volts(value)])).toEqual(['over-the-lab-limit']);
	});

	it.each([['1.35'], ['1350 mV'], ['1.2'], ['Auto']])('are kept by %s', (value) => {
		expect(kinds([volts(value)])).toEqual([]);
	});

	it('cannot be told for an offset or a word', () => {
		expect(kinds([volts('+0.05')])).toEqual(['limit-not-told']);
		const power = fact({ setting: 'Power', quantity: 'power-limit', unit: 'W', value: 'Unlimited' });
		expect(kinds([power, { ...power, value: 'Off' }])).toEqual(['limit-not-told', 'limit-not-told']);
	});

	it('say whose they are, why, and that the maker’s stand above them', () => {
		expect(limitAdvice([volts('1.4')], limits, ['processor'])).toEqual([
			{
				kind: 'over-the-lab-limit',
				severity: 'warning',
				words:
					'Core voltage is set to 1.4 V, over the lab’s own limit of 1350 mV. The maker’s limit for your part stands above ours.',
				settings: ['Core voltage'],
				source: 'the lab’s limits table: two parts lost in May'
			}
		]);
	});

	it('are the lowest of those that apply', () => {
		expect(limitAdvice([volts('1.2')], limits)[0]?.words).toMatch('1.1 V');
	});

	it('leave alone what they do not name', () => {
		expect(kinds([fact({ setting: 'Fans', value: '9' })])).toEqual([]);
		const wrong: LabLimit = { quantity: 'core-voltage', partKind: 'other', limit: 1, unit: 'W', source: '' };
		expect(limitAdvice([volts('1.4')], [wrong])).toEqual([]);
	});
});
