import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Presence, type Present } from './presence.svelte';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

function started(answers: (Present[] | null)[]) {
	const told: unknown[] = [];
	let now = 0;
	const presence = new Presence({
		tell: (said) => {
			told.push(said);
			return Promise.resolve(answers.shift() ?? []);
		},
		now: () => now
	});
	return { presence, told, at: (ms: number) => (now = ms) };
}
const marit = { name: 'Marit Oake', lastKeyAgoS: 10 };

describe('who has an article open', () => {
	it('is asked at once and then every fifteen seconds, with how long ago the last key was', async () => {
		const { presence, told, at } = started([[marit], []]);
		presence.begin();
		await vi.advanceTimersByTimeAsync(0);
		expect(presence.others).toEqual([marit]);
		presence.keyed();
		at(15_000);
		await vi.advanceTimersByTimeAsync(15_000);
		expect(told).toEqual([
			{ lastKeyAgoS: null, leaving: false },
			{ lastKeyAgoS: 15, leaving: false }
		]);
		expect(presence.others).toEqual([]);
	});

	it('is nobody while the server does not answer, and is asked again', async () => {
		const { presence, told } = started([[marit], null, [marit]]);
		presence.begin();
		await vi.advanceTimersByTimeAsync(15_000);
		expect(presence.others).toEqual([]);
		await vi.advanceTimersByTimeAsync(15_000);
		expect([presence.others, told.length]).toEqual([[marit], 3]);
	});

	it('is told that we left, and asked no more', async () => {
		const { presence, told } = started([]);
		presence.begin();
		await vi.advanceTimersByTimeAsync(0);
		presence.end();
		await vi.advanceTimersByTimeAsync(60_000);
		expect(told).toEqual([
			{ lastKeyAgoS: null, leaving: false },
			{ lastKeyAgoS: null, leaving: true }
		]);
	});
});
