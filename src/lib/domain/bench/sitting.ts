/** A reading that was typed and is not on record yet, as far as the browser knows. */
export interface TypedReading {
	/** Made by the browser and sent along, so that sending it twice stores it once. */
	key: string;
	value: number;
	/**
	 * waiting: to be sent; stored: the server said so; refused: the server would not have it, and why; held: another
	 * tester's readings came in between, and its writer decides.
	 */
	state: 'waiting' | 'stored' | 'refused' | 'held';
	message?: string;
	/** The row it became. */
	id?: number;
	/** Others' readings of the cell that stood on the screen when it was typed; absent where nobody asks. */
	seen?: number;
	/** Whether it went out once: the server may have it, though it did not say so. */
	sent?: boolean;
}

/** What stands against held readings: the others' that their writer had not seen. */
export interface HeldOver {
	kind: 'over';
	needed: number;
	/** Counted readings of others now: sent back as seen, it says that both are to be kept. */
	othersSeen: number;
	theirs: { id: number; value: number; by: string; at: string }[];
}

/** What was typed into one cell since the page was opened: one run in the making. Plain data, kept in the browser. */
export interface Sitting {
	profile: string;
	workload: string;
	unit: string;
	/** One run per sitting. */
	runKey: string;
	/** As typed, in °C. */
	ambient: string;
	/** Local time in the publication's zone, as typed; empty for the time of the first reading. */
	started: string;
	/** When the first reading was typed, ISO. */
	firstAt: string | null;
	notes: string;
	/** Whether the circumstances changed since they were last sent. */
	changed: boolean;
	readings: TypedReading[];
	/** Texts in the cells that are not readings yet. */
	drafts: { id: string; text: string }[];
	/** Set while readings of it are held. */
	held?: HeldOver | null;
}

export const newSitting = (
	cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>,
	key: () => string
): Sitting => ({
	...cell,
	runKey: key(),
	ambient: '',
	started: '',
	firstAt: null,
	notes: '',
	changed: false,
	readings: [],
	drafts: []
});

export const waitingOf = (sitting: Sitting): TypedReading[] =>
	sitting.readings.filter((reading) => reading.state === 'waiting');

/** Whether there is anything to send. */
export const isOpen = (sitting: Sitting): boolean =>
	waitingOf(sitting).length > 0 ||
	(sitting.changed && sitting.readings.some((reading) => reading.state === 'stored'));

/** Whether it is worth keeping over a reload. */
export const isWorthKeeping = (sitting: Sitting): boolean =>
	isOpen(sitting) ||
	sitting.readings.some((reading) => reading.state === 'refused' || reading.state === 'held') ||
	sitting.drafts.some((draft) => draft.text.trim() !== '');

/** The readings after the server said which of them it has. */
export function withStored(
	readings: readonly TypedReading[],
	stored: readonly { key: string; id: number }[]
): TypedReading[] {
	const ids = new Map(stored.map((row) => [row.key, row.id]));
	return readings.map((reading) => {
		const id = ids.get(reading.key);
		return id === undefined ? reading : { key: reading.key, value: reading.value, state: 'stored', id };
	});
}

/** The readings after the server would not have those sent, each with why. */
export function withRefused(
	readings: readonly TypedReading[],
	sent: readonly string[],
	message: string
): TypedReading[] {
	return readings.map((reading) =>
		sent.includes(reading.key) && reading.state === 'waiting'
			? { ...reading, state: 'refused', message }
			: reading
	);
}

/** Others' readings that the writer of all waiting ones had seen; null where one of them asks nothing. */
export function othersSeenOf(sitting: Sitting): number | null {
	const seen = waitingOf(sitting).map((reading) => reading.seen);
	const told = seen.flatMap((count) => count ?? []);
	return told.length === 0 || told.length < seen.length ? null : Math.min(...told);
}

/** The readings after the server held those sent. */
export const withHeld = (readings: readonly TypedReading[], sent: readonly string[]): TypedReading[] =>
	readings.map((reading) =>
		sent.includes(reading.key) && reading.state === 'waiting' ? { ...reading, state: 'held' } : reading
	);

/** The held readings made ready to be sent again, their writer having seen the others'. */
export const withBothKept = (readings: readonly TypedReading[], othersSeen: number): TypedReading[] =>
	readings.map((reading) =>
		reading.state === 'held' ? { ...reading, state: 'waiting', seen: othersSeen } : reading
	);

const isText = (value: unknown): value is string => typeof value === 'string';

function isSitting(value: unknown): value is Sitting {
	if (typeof value !== 'object' || value === null) return false;
	const one = value as Partial<Record<keyof Sitting, unknown>>;
	return (
		[one.profile, one.workload, one.unit, one.runKey, one.ambient, one.started, one.notes].every(isText) &&
		Array.isArray(one.readings) &&
		Array.isArray(one.drafts)
	);
}

/** Sittings as they were kept in the browser; what cannot be read there is left out. */
export function readSittings(text: string | null): Sitting[] {
	if (text === null) return [];
	try {
		const kept: unknown = JSON.parse(text);
		return Array.isArray(kept) ? kept.filter(isSitting) : [];
	} catch {
		return [];
	}
}
