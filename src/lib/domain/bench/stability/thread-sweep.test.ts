import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkSweep, type SweepPoint } from './thread-sweep';

const sound: SweepPoint[] = [
	{ threads: 1, currentA: 24.5, clockMHz: 5450 },
	{ threads: 2, currentA: 39, clockMHz: 5425 },
	{ threads: 4, currentA: 66, clockMHz: 5325 },
	{ threads: 8, currentA: 112, clockMHz: 5100 }
];
const withRow = (row: number, change: Partial<SweepPoint>) =>
	checkSweep(sound.map((point, index) => (index === row ? { ...point, ...change } : point))).map(
		(finding) => ({
			...finding,
			message: finding.message.replaceAll('\u00a0', ' ')
		})
	);

// Bounds are common practice, no source.
describe('a pass of a sweep', () => {
	it('has nothing to say of a sound one', () => {
		expect(checkSweep(sound)).toEqual([]);
		expect(checkSweep([])).toEqual([]);
	});

	it.each([0, -1, 1.5, NaN, 5000])('refuses %d threads', (threads) => {
		expect(withRow(0, { threads })[0]).toMatchObject({ row: 0, field: 'threads', kind: 'refused' });
	});

	it('refuses threads that come twice or fall', () => {
		expect(withRow(1, { threads: 1 })).toEqual([
			{
				row: 1,
				field: 'threads',
				kind: 'refused',
				message: 'Row 1 has as many threads. Send a repeat as a pass of its own.',
				meant: null
			}
		]);
		expect(withRow(2, { threads: 12 })).toMatchObject([{ row: 3, field: 'threads', kind: 'refused' }]);
	});

	it('asks about a value a thousand times off', () => {
		expect(withRow(1, { clockMHz: 5.425 })).toEqual([
			{ row: 1, field: 'clockMHz', kind: 'asked', message: '5.425 MHz: is 5425 MHz meant?', meant: 5425 }
		]);
		expect(withRow(2, { currentA: 66_000 })).toMatchObject([
			{ kind: 'asked', meant: 66, field: 'currentA', message: '66 000 A: is 66 A meant?' }
		]);
		expect(withRow(2, { currentA: 0.066 })).toMatchObject([{ kind: 'asked', meant: 66 }]);
		expect(withRow(0, { clockMHz: 5_450_000 })).toMatchObject([{ kind: 'asked', meant: 5450 }]);
	});

	it('asks about a whole column in another unit', () => {
		const inGHz = sound.map((point) => ({ ...point, clockMHz: point.clockMHz / 1000 }));
		expect(checkSweep(inGHz).map(({ kind, meant }) => ({ kind, meant }))).toEqual(
			sound.map(({ clockMHz }) => ({ kind: 'asked', meant: clockMHz }))
		);
	});

	it('asks about a value that is unlikely in another way', () => {
		expect(withRow(0, { clockMHz: 50 })).toMatchObject([{ kind: 'asked', meant: null }]);
		expect(withRow(3, { currentA: 2100 })).toMatchObject([{ kind: 'asked' }]);
	});

	it('takes no current at all, refuses what cannot be', () => {
		expect(withRow(0, { currentA: 0 })).toEqual([]);
		expect(withRow(0, { clockMHz: 0 })).toMatchObject([{ kind: 'refused', field: 'clockMHz' }]);
		expect(withRow(0, { currentA: -3 })).toMatchObject([{ kind: 'refused', field: 'currentA' }]);
		expect(withRow(0, { currentA: Infinity })).toMatchObject([{ kind: 'refused', field: 'currentA' }]);
	});

	it('finds one value a thousand times off, wherever it stands', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 0, max: 3 }),
				fc.constantFrom('currentA' as const, 'clockMHz' as const),
				fc.constantFrom(1000, 1 / 1000),
				(row, field, factor) => {
					const value = sound[row]?.[field] ?? NaN;
					const found = withRow(row, { [field]: value * factor });
					expect(found).toMatchObject([{ row, field, kind: 'asked' }]);
					expect(found[0]?.meant).toBeCloseTo(value, 6);
				}
			)
		);
	});
});
