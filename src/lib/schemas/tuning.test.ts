import { describe, expect, it } from 'vitest';
import { limitEdit, limitInput, meaningInput } from './tuning';

const messages = (schema: typeof limitInput | typeof meaningInput, input: unknown) =>
	schema.safeParse(input).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`) ?? [];

describe('a meaning', () => {
	const typed = { family: 'Plainboard 4', setting: ' Multiplier ', quantity: 'core-ratio' };

	it('is of all cores unless it says which', () => {
		expect(meaningInput.parse(typed)).toEqual({ ...typed, setting: 'Multiplier', coreGroup: 0 });
		expect(meaningInput.parse({ ...typed, coreGroup: '2' }).coreGroup).toBe(2);
	});

	it('is refused where it says nothing', () => {
		expect(messages(meaningInput, { ...typed, quantity: 'other' })).toEqual([
			'quantity: Choose what it sets.'
		]);
		expect(messages(meaningInput, { ...typed, setting: ' ', coreGroup: '65' })).toEqual([
			'setting: Name the setting as the firmware does.',
			'coreGroup: Write a number from 0 to 64.'
		]);
	});
});

describe('a limit of the lab', () => {
	const typed = {
		quantity: 'core-voltage',
		partKind: 'processor',
		limit: '1,35',
		unit: 'V',
		source: 'data sheet'
	};

	it('is read with either decimal mark', () => {
		expect(limitInput.parse(typed).limit).toBe(1.35);
		expect(limitEdit.parse({ ...typed, version: 1 }).version).toBe(1);
	});

	it('is refused in a unit it cannot be held against, and without its reason', () => {
		expect(messages(limitInput, { ...typed, unit: 'W' })).toEqual([
			'unit: Give a unit that this is set in, such as V for a voltage or W for power.'
		]);
		expect(messages(limitInput, { ...typed, source: '' })).toHaveLength(1);
		expect(messages(limitInput, { ...typed, limit: '0' })).toHaveLength(1);
	});
});
