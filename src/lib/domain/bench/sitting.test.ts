import { describe, expect, it } from 'vitest';
import {
	isOpen,
	isWorthKeeping,
	newSitting,
	othersSeenOf,
	readSittings,
	withBothKept,
	withHeld,
	type Sitting,
	type TypedReading
} from './sitting';

const reading = (key: string, more: Partial<TypedReading> = {}): TypedReading => ({
	key,
	value: 1,
	state: 'waiting',
	...more
});
const sitting = (readings: TypedReading[]): Sitting => ({
	...newSitting({ profile: 'stock', workload: 'render', unit: 's' }, () => 'key'),
	readings
});

describe('what the writer had seen of others', () => {
	it('is the least of what stood there as each was typed', () => {
		expect(othersSeenOf(sitting([reading('a', { seen: 2 }), reading('b', { seen: 4 })]))).toBe(2);
	});

	it('is nothing where one of them asks nothing, or none waits', () => {
		expect(othersSeenOf(sitting([reading('a', { seen: 2 }), reading('b')]))).toBeNull();
		expect(othersSeenOf(sitting([reading('a', { seen: 2, state: 'stored', id: 1 })]))).toBeNull();
	});
});

describe('held readings', () => {
	const held = sitting(withHeld([reading('a', { state: 'stored', id: 1 }), reading('b')], ['a', 'b']));

	it('are not sent by themselves, but kept over a reload', () => {
		expect(held.readings.map((one) => one.state)).toEqual(['stored', 'held']);
		expect(isOpen(held)).toBe(false);
		expect(isWorthKeeping(held)).toBe(true);
		expect(readSittings(JSON.stringify([held]))).toEqual([held]);
	});

	it('go out again with what was seen since', () => {
		const kept = sitting(withBothKept(held.readings, 6));
		expect(kept.readings.map((one) => one.state)).toEqual(['stored', 'waiting']);
		expect(othersSeenOf(kept)).toBe(6);
	});
});
