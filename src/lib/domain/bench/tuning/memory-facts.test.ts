import { describe, expect, it } from 'vitest';
import type { SettingQuantity } from '../words';
import { memoryFacts, ratioFacts, rowCycleFacts } from './memory-facts';
import { fact } from './setting-fact.fixture';

const rate = (value: string) => fact({ quantity: 'memory-data-rate', unit: 'MT/s', value });
const clocks = (quantity: SettingQuantity, value: string) => fact({ quantity, value });
const mhz = (quantity: SettingQuantity, value: string) => fact({ quantity, unit: 'MHz', value });

describe('memory timings', () => {
	it('are told in ns', () => {
		// A public memory simulator's table for DDR3-1333 with a period of 1.5 ns: tRCD 9 is 13.5 ns, tRAS 24 is 36 ns.
		const found = memoryFacts([
			rate('1333.3333'),
			clocks('row-to-column-delay', '9'),
			clocks('row-active', '24')
		]);
		const ns = Object.fromEntries(found.map(({ name, value }) => [name, value]));
		expect(ns['Row to column delay, tRCD']).toBeCloseTo(13.5, 5);
		expect(ns['Row active time, tRAS']).toBeCloseTo(36, 5);
		expect(ns['Memory clock period']).toBeCloseTo(1.5, 6);
	});

	it('say their formula and how far to print them', () => {
		// 22 at 3200 MT/s is 13.75 ns, as for the first word of CL22 in public listings.
		expect(memoryFacts([rate('3200'), clocks('row-precharge', '22T')])).toContainEqual({
			name: 'Row precharge, tRP',
			value: 13.75,
			unit: 'ns',
			decimals: 2,
			how: '2000 × tRP ÷ data rate: 2000 × 22 ÷ 3200 MT/s'
		});
	});

	it('hold the row cycle against its parts', () => {
		// The same table: tRC 33 = tRAS 24 + tRP 9.
		const parts = [clocks('row-active', '24'), clocks('row-precharge', '9')];
		expect(rowCycleFacts([clocks('row-cycle', '33'), ...parts])).toMatchObject([
			{ value: 0, unit: 'clocks', how: 'tRC − (tRAS + tRP): 33 − (24 + 9)' }
		]);
		expect(rowCycleFacts([clocks('row-cycle', '30'), ...parts])[0]?.value).toBe(-3);
		expect(rowCycleFacts(parts)).toEqual([]);
	});
});

describe('fabric, controller and memory', () => {
	it('are one ratio where all are set', () => {
		const all = [rate('6000'), mhz('memory-controller-clock', '3000'), mhz('fabric-clock', '2000')];
		expect(ratioFacts(all).at(-1)).toMatchObject({
			name: 'Fabric to controller to memory clock',
			text: '2 : 3 : 3',
			how: '2000 : 3000 : 3000 MHz; not synchronous; as one number, slowest ÷ fastest'
		});
	});

	it('are synchronous where all run as one', () => {
		// 3600 MT/s beside 1800 MHz is 1:1 (arithmetic).
		const all = [rate('3600'), mhz('memory-controller-clock', '1800'), mhz('fabric-clock', '1800')];
		expect(ratioFacts(all).at(-1)).toMatchObject({ text: '1 : 1 : 1', value: 1 });
		expect(ratioFacts(all).at(-1)?.how).toMatch('MHz; synchronous');
	});

	it('are pairs alone where one is missing', () => {
		expect(ratioFacts([rate('6000'), mhz('fabric-clock', '2000')]).map(({ name }) => name)).toEqual([
			'Fabric clock to memory clock'
		]);
	});
});
