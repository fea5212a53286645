import { describe, expect, it, vi } from 'vitest';
import { sharedReads } from './share-read';

/** Readings that end when they are told to. */
function slow() {
	const ends: (() => void)[] = [];
	let begun = 0;
	const read = () => {
		const n = ++begun;
		return new Promise<number>((done) => ends.push(() => done(n)));
	};
	const settle = () => new Promise((done) => setImmediate(done));
	return { read, ends, settle, begun: () => begun };
}

describe('a shared reading', () => {
	it('is one for all who come while another runs, begun after they came', async () => {
		const { read, ends, settle, begun } = slow();
		const share = sharedReads<number>();
		const first = share(1, read);
		const later = [share(1, read), share(1, read), share(1, read)];
		expect(begun()).toBe(1);
		ends[0]?.();
		expect(await first).toBe(1);
		await settle();
		ends[1]?.();
		expect(await Promise.all(later)).toEqual([2, 2, 2]);
		await settle();
		const anew = share(1, read);
		ends[2]?.();
		expect(await anew).toBe(3);
	});

	it('waits for those who come in a burst, and begins at once for one who does not wait', async () => {
		vi.useFakeTimers();
		try {
			const share = sharedReads<number>();
			let begun = 0;
			const read = () => Promise.resolve(++begun);
			const burst = [share(1, read, 50), share(1, read, 50)];
			await vi.advanceTimersByTimeAsync(49);
			burst.push(share(1, read, 50));
			expect(begun).toBe(0);
			await vi.advanceTimersByTimeAsync(1);
			expect(await Promise.all(burst)).toEqual([1, 1, 1]);
			const patient = share(1, read, 50);
			expect(await share(1, read)).toBe(2);
			expect(await patient).toBe(2);
			await vi.advanceTimersByTimeAsync(100);
			expect(begun).toBe(2);
		} finally {
			vi.useRealTimers();
		}
	});

	it('keeps what is not the same apart, and goes on after a failure', async () => {
		const share = sharedReads<string>();
		const fails = share(1, () => Promise.reject(new Error('gone')));
		const next = share(1, () => Promise.resolve('here'));
		const other = share(2, () => Promise.resolve('there'));
		await expect(fails).rejects.toThrow('gone');
		expect(await Promise.all([next, other])).toEqual(['here', 'there']);
	});
});
