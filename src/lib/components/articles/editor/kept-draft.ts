import type { Unsaved } from './autosave.svelte';

/** A text that was typed in this browser and not saved. */
export interface KeptDraft extends Unsaved {
	/** ISO time of the last key. */
	at: string;
}

const keyOf = (personId: string, slug: string) => `calipress:draft:${personId}:${slug}`;

const isDraft = (value: unknown): value is KeptDraft =>
	typeof value === 'object' &&
	value !== null &&
	['title', 'standfirst', 'source', 'at'].every((key) => typeof Reflect.get(value, key) === 'string') &&
	typeof Reflect.get(value, 'basedOn') === 'number';

/** What this browser kept of a person's text; null where there is nothing, or the browser keeps nothing. */
export function readKept(personId: string, slug: string): KeptDraft | null {
	try {
		const value: unknown = JSON.parse(localStorage.getItem(keyOf(personId, slug)) ?? 'null');
		return isDraft(value) ? value : null;
	} catch {
		return null;
	}
}

/** Keeps a text, or forgets it with null. A browser that refuses (private window, full) is let be: the save goes on. */
export function keepDraft(personId: string, slug: string, draft: Unsaved | null): void {
	try {
		if (draft === null) localStorage.removeItem(keyOf(personId, slug));
		else
			localStorage.setItem(keyOf(personId, slug), JSON.stringify({ ...draft, at: new Date().toISOString() }));
	} catch {
		return;
	}
}
