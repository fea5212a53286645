import { describe, expect, it } from 'vitest';
import type { SettingQuantity } from '../words';
import { fact } from './setting-fact.fixture';
import { timingAdvice } from './timing-advice';

const timings = (given: Partial<Record<SettingQuantity, string>>) =>
	Object.entries(given).map(([quantity, value]) =>
		fact({ setting: quantity, quantity: quantity as SettingQuantity, value })
	);

// A public memory simulator's table for DDR3-1333: CL 9, tRCD 9, tRP 9, tRAS 24, tRC 33.
const published = {
	'cas-latency': '9',
	'row-to-column-delay': '9',
	'row-precharge': '9',
	'row-active': '24',
	'row-cycle': '33'
} as const;

describe('timings in order', () => {
	it('finds nothing in a published table', () => {
		expect(timingAdvice(timings(published))).toEqual([]);
	});

	it('finds a row that is closed too early', () => {
		expect(timingAdvice(timings({ ...published, 'row-active': '17', 'row-cycle': '26' }))).toMatchObject([
			{ kind: 'timings-out-of-order', settings: ['row-active', 'row-to-column-delay', 'cas-latency'] }
		]);
	});

	it('finds a row cycle shorter than its parts', () => {
		const [advice] = timingAdvice(timings({ ...published, 'row-cycle': '32' }));
		expect(advice?.words).toMatch(/^tRC is 32 and tRAS \+ tRP are 33\. /);
	});

	it('says nothing where one is left to the board', () => {
		expect(timingAdvice(timings({ ...published, 'row-precharge': 'Auto', 'row-cycle': '5' }))).toEqual([]);
	});
});
