import { describe, expect, it } from 'vitest';
import { protocolSentence } from './protocol';

const tile = {
	quantity: 'time',
	unit: 's',
	better: 'lower',
	warmUps: 1,
	repeats: 7,
	coolDownS: 120,
	headline: 'mean',
	leastDifferencePercent: 1
} as const;

describe('protocolSentence', () => {
	it('says how a workload is measured', () => {
		expect(protocolSentence(tile)).toBe(
			'After a warm-up run that is not counted, it is run 7 times with 2 minutes to cool down between runs. Each run gives one reading of time in s; less is better. In print stands the mean. A difference under 1 % does not matter in use.'
		);
	});

	it('leaves out what the protocol leaves out', () => {
		expect(
			protocolSentence({ ...tile, warmUps: 0, repeats: 1, better: 'higher', leastDifferencePercent: 0.75 })
		).toBe(
			'Without a warm-up, it is run once. Each run gives one reading of time in s; more is better. In print stands the mean. A difference under 0.75 % does not matter in use.'
		);
		expect(protocolSentence({ ...tile, warmUps: 3, coolDownS: 45 })).toContain(
			'After 3 warm-up runs that are not counted, it is run 7 times with 45 s to cool down'
		);
	});
});
