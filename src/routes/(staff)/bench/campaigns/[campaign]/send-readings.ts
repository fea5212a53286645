import { parseReading } from '$lib/domain/bench/numbers';
import { othersSeenOf, waitingOf, type HeldOver, type Sitting } from '$lib/domain/bench/sitting';
import type { GridAnswer } from '$lib/server/services/bench/record-grid-readings';

/** How a sending ended: on record, refused for a reason, or not heard at all. */
export type Sent =
	| { kind: 'stored'; stored: GridAnswer['stored'] }
	| { kind: 'refused'; message: string }
	| { kind: 'held'; message: string; held: HeldOver }
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
		othersSeen: othersSeenOf(sitting),
		readings: waitingOf(sitting).map(({ key, value }) => ({ key, value }))
	};
}

const unreached = (message: string): Sent => ({ kind: 'unreached', message });

const isHeld = (context: unknown): context is HeldOver =>
	typeof context === 'object' && context !== null && 'kind' in context && context.kind === 'over';

/** A refusal in the words of whatever answered, or what holds the readings back. */
async function refusalOf(response: Response): Promise<Sent> {
	const unsaid = 'The server refused this.';
	try {
		const body = (await response.json()) as {
			detail?: unknown;
			context?: unknown;
			errors?: Record<string, string[]>;
		};
		const [field] = Object.values(body.errors ?? {}).flat();
		const message = field ?? (typeof body.detail === 'string' ? body.detail : unsaid);
		return isHeld(body.context)
			? { kind: 'held', message, held: body.context }
			: { kind: 'refused', message };
	} catch {
		return { kind: 'refused', message: unsaid };
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
		try {
			const { stored } = (await response.json()) as GridAnswer;
			return { kind: 'stored', stored };
		} catch {
			return unreached('The answer was cut off.');
		}
	}
	if (response.status === 401)
		return unreached('You are signed out. Sign in again in another tab; nothing typed is lost.');
	if (response.status >= 500 || response.status === 429 || response.status === 408)
		return unreached('The server does not answer as it should.');
	return refusalOf(response);
}
