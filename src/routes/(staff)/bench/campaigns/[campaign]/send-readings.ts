import { parseReading } from '$lib/domain/bench/numbers';
import { waitingOf, type Sitting } from '$lib/domain/bench/sitting';
import type { GridAnswer } from '$lib/server/services/bench/record-grid-readings';

/** How a sending ended: on record, refused for a reason, or not heard at all. */
export type Sent =
	| { kind: 'stored'; stored: GridAnswer['stored'] }
	| { kind: 'refused'; message: string }
	| { kind: 'unreached'; message: string };

/** A sitting as the server takes it. */
export function bodyOf(sitting: Sitting): Record<string, unknown> {
	const ambient = parseReading(sitting.ambient);
	return {
		profile: sitting.profile,
		workload: sitting.workload,
		unit: sitting.unit,
		runKey: sitting.runKey,
		ambientC: ambient.ok ? ambient.value : null,
		startedAt: sitting.firstAt,
		started: sitting.started,
		notes: sitting.notes,
		readings: waitingOf(sitting).map(({ key, value }) => ({ key, value }))
	};
}

const unreached = (message: string): Sent => ({ kind: 'unreached', message });

/** The reason in a refusal, whatever answered. */
async function reasonOf(response: Response): Promise<string> {
	try {
		const body = (await response.json()) as { detail?: unknown; errors?: Record<string, string[]> };
		const fields = Object.values(body.errors ?? {}).flat();
		return fields[0] ?? (typeof body.detail === 'string' ? body.detail : 'The server refused this.');
	} catch {
		return 'The server refused this.';
	}
}

/**
 * Sends a sitting's waiting readings.
 * @param post the browser's fetch
 */
export async function sendReadings(post: typeof fetch, address: string, sitting: Sitting): Promise<Sent> {
	let response: Response;
	try {
		response = await post(address, {
			method: 'POST',
			headers: { 'content-type': 'application/json' },
			body: JSON.stringify(bodyOf(sitting))
		});
	} catch {
		return unreached('No connection.');
	}
	if (response.ok) {
		const { stored } = (await response.json()) as GridAnswer;
		return { kind: 'stored', stored };
	}
	if (response.status === 401)
		return unreached('You are signed out. Sign in again in another tab; nothing typed is lost.');
	if (response.status >= 500 || response.status === 429 || response.status === 408)
		return unreached('The server does not answer as it should.');
	return { kind: 'refused', message: await reasonOf(response) };
}
