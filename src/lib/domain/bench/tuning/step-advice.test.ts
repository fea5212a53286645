import { describe, expect, it } from 'vitest';
import type { SettingQuantity } from '../words';
import { fact } from './setting-fact.fixture';
import { stepAdvice } from './step-advice';

const rate = (value: string) =>
	fact({ setting: 'Data rate', quantity: 'memory-data-rate', unit: 'MT/s', value });
const mhz = (quantity: SettingQuantity, value: string) =>
	fact({ setting: quantity, quantity, unit: 'MHz', value });

describe('memory, controller and fabric in step', () => {
	// 6000 MT/s beside 3000 MHz is 1:1, beside 1500 MHz 1:2 (arithmetic; the naming is common practice).
	it('says nothing where they are', () => {
		expect(
			stepAdvice([rate('6000'), mhz('memory-controller-clock', '3000'), mhz('fabric-clock', '3000')])
		).toEqual([]);
		expect(stepAdvice([rate('2666.667'), mhz('memory-controller-clock', '1333')])).toEqual([]);
	});

	it('names the pair that is not', () => {
		const [advice, ...more] = stepAdvice([rate('6000'), mhz('fabric-clock', '2000')]);
		expect(more).toEqual([]);
		expect(advice).toMatchObject({
			kind: 'fabric-not-in-step',
			severity: 'advice',
			settings: ['fabric-clock', 'Data rate']
		});
		expect(advice?.words).toMatch(
			'The fabric runs at 2000 MHz and the memory at 3000 MHz, so they are not in step.'
		);
	});

	it('knows a controller at half the clock', () => {
		const [advice] = stepAdvice([rate('6000'), mhz('memory-controller-clock', '1500')]);
		expect(advice?.kind).toBe('controller-not-in-step');
		expect(advice?.words).toMatch('half its clock');
	});

	it('says nothing where it cannot be told', () => {
		expect(stepAdvice([mhz('fabric-clock', '2000')])).toEqual([]);
		expect(stepAdvice([rate('Auto'), mhz('fabric-clock', '2000')])).toEqual([]);
		expect(stepAdvice([rate('6000'), rate('5600'), mhz('fabric-clock', '2000')])).toEqual([]);
	});
});
