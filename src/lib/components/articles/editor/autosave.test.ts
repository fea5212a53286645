import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Autosave, type Draft, type SaveAnswer, type Theirs } from './autosave.svelte';

const first: Draft = { title: 'Brisk 360', standfirst: '', source: 'one' };
const theirs: Theirs = {
	...first,
	source: 'theirs',
	number: 5,
	savedAt: '2026-11-11T08:00:00.000Z',
	savedByName: 'Marit Oake'
};

function started(answers: SaveAnswer[]) {
	const sent: (Draft & { basedOn: number })[] = [];
	let kept: unknown = null;
	const autosave = new Autosave({
		draft: first,
		revision: 4,
		savedAt: '2026-11-11T07:00:00.000Z',
		send: (draft) => {
			sent.push(draft);
			return Promise.resolve(answers.shift() ?? { kind: 'unreachable', message: 'no answer left' });
		},
		keep: (draft) => (kept = draft)
	});
	return { autosave, sent, kept: () => kept };
}
const saved = (revision: number): SaveAnswer => ({
	kind: 'saved',
	revision,
	savedAt: '2026-11-11T08:10:00.000Z',
	approvalTakenOff: false,
	stage: 'drafting',
	version: revision
});

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('saving while somebody writes', () => {
	it('saves once, a second and a half after the last key, and keeps the text in the browser until then', async () => {
		const { autosave, sent, kept } = started([saved(5)]);
		autosave.edit({ ...first, source: 'one t' });
		await vi.advanceTimersByTimeAsync(1400);
		autosave.edit({ ...first, source: 'one two' });
		expect(kept()).toMatchObject({ source: 'one two', basedOn: 4 });
		await vi.advanceTimersByTimeAsync(1400);
		expect(sent).toHaveLength(0);
		await vi.advanceTimersByTimeAsync(200);
		expect(sent).toEqual([{ ...first, source: 'one two', basedOn: 4 }]);
		expect(autosave).toMatchObject({ state: 'saved', revision: 5 });
		expect(kept()).toBeNull();
	});

	it('sends nothing for a text that is back where it was', async () => {
		const { autosave, sent, kept } = started([]);
		autosave.edit({ ...first, source: 'x' });
		autosave.edit({ ...first });
		await vi.runAllTimersAsync();
		expect(sent).toHaveLength(0);
		expect(autosave.state).toBe('saved');
		expect(kept()).toBeNull();
	});

	it('keeps the text when nothing answers, and tries again by itself', async () => {
		const { autosave, kept } = started([{ kind: 'unreachable', message: 'offline' }, saved(5)]);
		autosave.edit({ ...first, source: 'two' });
		await vi.advanceTimersByTimeAsync(1600);
		expect(autosave).toMatchObject({ state: 'failed', message: 'offline' });
		expect(kept()).toMatchObject({ source: 'two' });
		await vi.advanceTimersByTimeAsync(10_000);
		expect(autosave).toMatchObject({ state: 'saved', revision: 5 });
	});

	it('goes on from a save of its own whose answer got lost', async () => {
		const lost = { ...theirs, source: 'two' };
		const { autosave, sent } = started([
			{ kind: 'unreachable', message: 'lost' },
			{ kind: 'conflict', theirs: lost, message: '' },
			saved(6)
		]);
		autosave.edit({ ...first, source: 'two' });
		await vi.advanceTimersByTimeAsync(1600);
		autosave.edit({ ...first, source: 'two three' });
		await vi.advanceTimersByTimeAsync(1600);
		expect(sent.at(-1)).toMatchObject({ source: 'two three', basedOn: 5 });
		expect(autosave).toMatchObject({ state: 'saved', revision: 6, theirs: null });
	});
});

describe('a revision of somebody else', () => {
	async function inConflict(more: SaveAnswer[] = []) {
		const it = started([{ kind: 'conflict', theirs, message: 'Marit saved revision 5.' }, ...more]);
		it.autosave.edit({ ...first, source: 'mine' });
		await vi.advanceTimersByTimeAsync(1600);
		return it;
	}

	it('stops the saving, keeps what is typed on, and says whose it is', async () => {
		const { autosave, sent, kept } = await inConflict();
		expect(autosave).toMatchObject({ state: 'conflict', theirs: { savedByName: 'Marit Oake' } });
		autosave.edit({ ...first, source: 'mine and more' });
		await vi.runAllTimersAsync();
		expect(sent).toHaveLength(1);
		expect(kept()).toMatchObject({ source: 'mine and more' });
	});

	it('can be taken', async () => {
		const { autosave, kept } = await inConflict();
		expect(autosave.takeTheirs()).toMatchObject({ source: 'theirs' });
		expect(autosave).toMatchObject({ state: 'saved', revision: 5, theirs: null });
		expect(kept()).toBeNull();
	});

	it('can be put together with ours, which is the next revision over theirs', async () => {
		const { autosave, sent, kept } = await inConflict([saved(6)]);
		await autosave.takeMerged({ ...first, source: 'mine and theirs' });
		expect(sent.at(-1)).toEqual({ ...first, source: 'mine and theirs', basedOn: 5 });
		expect(autosave).toMatchObject({ state: 'saved', revision: 6, theirs: null });
		expect(kept()).toBeNull();
	});

	it('that is overtaken by a third is a conflict again, with nothing lost', async () => {
		const third = { ...theirs, number: 6, source: 'a third' };
		const { autosave, kept } = await inConflict([{ kind: 'conflict', theirs: third, message: '' }]);
		await autosave.takeMerged({ ...first, source: 'mine and theirs' });
		expect(autosave).toMatchObject({ state: 'conflict', theirs: { number: 6 } });
		expect(kept()).toMatchObject({ source: 'mine and theirs' });
	});

	it('can be followed by ours as the next revision', async () => {
		const { autosave, sent } = await inConflict([saved(6)]);
		await autosave.keepMine();
		expect(sent.at(-1)).toEqual({ ...first, source: 'mine', basedOn: 5 });
		expect(autosave).toMatchObject({ state: 'saved', revision: 6 });
	});
});

describe('a page that was closed with a text in it', () => {
	it('goes on from the revision the text was written on, so that a newer one is seen', async () => {
		const { autosave, sent } = started([{ kind: 'conflict', theirs, message: '' }]);
		autosave.resume({ ...first, source: 'kept', basedOn: 3 });
		await vi.advanceTimersByTimeAsync(1600);
		expect(sent).toEqual([{ ...first, source: 'kept', basedOn: 3 }]);
		expect(autosave.state).toBe('conflict');
	});

	it('knows the newest revision for its own, whose answer got lost, and goes on from there', async () => {
		const { autosave, sent } = started([saved(5)]);
		autosave.resume({ ...first, source: 'one and more', basedOn: 3, sent: { ...first } });
		await vi.advanceTimersByTimeAsync(1600);
		expect(sent).toEqual([{ ...first, source: 'one and more', basedOn: 4 }]);
		expect(autosave.state).toBe('saved');
	});
});
