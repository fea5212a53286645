import { browser } from '$app/environment';
import type { Store } from './reading-queue.svelte';

/** The browser's storage; null on the server, and where the browser allows none. */
export function browserStore(): Store | null {
	try {
		return browser ? window.localStorage : null;
	} catch {
		return null;
	}
}
