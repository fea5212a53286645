import { describe, expect, it } from 'vitest';
import { boostAdvice, twiceAdvice, unitAdvice } from './reading-advice';
import { fact } from './setting-fact.fixture';

const ratio = fact({ setting: 'Core ratio', quantity: 'core-ratio', value: '52', stockValue: '47' });
const boost = (value: string) => fact({ setting: 'Boost', quantity: 'automatic-boost', value });
const rate = (setting: string, value: string, unit = 'MT/s') =>
	fact({ setting, quantity: 'memory-data-rate', unit, value });

describe('a ratio beside automatic boost', () => {
	it.each(['On', 'Auto', 'Standard'])('is pointed out while boost is %s', (value) => {
		expect(boostAdvice([ratio, boost(value)])).toMatchObject([
			{ kind: 'boost-left-on', settings: ['Core ratio', 'Boost'] }
		]);
	});

	it.each([
		['boost is off', [ratio, boost('Off')]],
		['boost is not named', [ratio]],
		['the ratio is stock’s', [{ ...ratio, value: '47' }, boost('On')]],
		['the ratio is a word', [{ ...ratio, value: 'Auto' }, boost('On')]]
	])('is passed over where %s', (_, settings) => {
		expect(boostAdvice(settings)).toEqual([]);
	});
});

describe('what cannot be computed with', () => {
	it('is a data rate set to two values', () => {
		expect(twiceAdvice([rate('Speed', '6000'), rate('Speed again', '5600')])).toMatchObject([
			{ kind: 'set-twice', settings: ['Speed', 'Speed again'] }
		]);
		expect(twiceAdvice([rate('Speed', '6000'), rate('Speed again', '6000')])).toEqual([]);
	});

	it('is not a reference clock for each chiplet', () => {
		const of = (setting: string, value: string) =>
			fact({ setting, quantity: 'reference-clock', unit: 'MHz', value });
		expect(twiceAdvice([of('Chiplet 1 reference', '100'), of('Chiplet 2 reference', '101')])).toEqual([]);
	});

	it('is a number whose unit does not fit', () => {
		expect(unitAdvice([rate('Speed', '6000', 'MHz')])[0]?.words).toMatch('Speed is 6000 in MHz');
		expect(unitAdvice([rate('Speed', '6000', '')])[0]?.words).toMatch('without a unit that fits');
		expect(unitAdvice([rate('Speed', 'Auto'), rate('Speed', '6000'), ratio, fact({ value: '3' })])).toEqual(
			[]
		);
	});
});
