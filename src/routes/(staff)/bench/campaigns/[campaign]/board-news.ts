import type { WiredNews } from '$lib/domain/bench/board-news';

/**
 * Asks a server what changed on a board. Null where it cannot be reached or does not say.
 * @param get the browser's fetch
 */
export async function askNews(
	get: typeof fetch,
	base: string,
	board: { tag: string; profile: string; workload: string }
): Promise<WiredNews | null> {
	try {
		const response = await get(`${base}/news?${new URLSearchParams({ ...board })}`);
		return response.ok ? ((await response.json()) as WiredNews) : null;
	} catch {
		return null;
	}
}
