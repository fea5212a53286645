import type { PlateSpec } from '../../../domain/articles/plates/spec';

/** Asks the server to draw plates, in order; none where it cannot be reached, so that the page shows words in their place. */
export const fetchPlatesFrom =
	(address: string) =>
	async (specs: PlateSpec[]): Promise<string[]> => {
		try {
			const response = await fetch(address, {
				method: 'POST',
				headers: { 'content-type': 'application/json' },
				body: JSON.stringify({ specs })
			});
			return response.ok ? ((await response.json()) as { drawings: string[] }).drawings : [];
		} catch {
			return [];
		}
	};
