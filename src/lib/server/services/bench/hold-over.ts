import type { HeldOver } from '../../../domain/bench/sitting';
import { refuse, type Refusal } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as readings from '../../db/queries/reading';
import * as runs from '../../db/queries/run';
import type { NamedCell } from './take-signature-off';

interface Sending {
	/** Run of the sender's own sitting; null before its first reading. */
	run: number | null;
	/** Readings not stored yet. */
	fresh: number;
	needed: number;
	/** Readings of others that the sender had seen; null for one who does not ask. */
	othersSeen: number | null;
}

function heldWords(theirs: HeldOver['theirs'], total: number, needed: number): string {
	const by = [...new Set(theirs.map((one) => one.by))].join(' and ');
	const stored = theirs.length === 1 ? 'a reading' : `${theirs.length} readings`;
	return `${by} stored ${stored} in this cell since you saw it. With yours it would have ${total} of the ${needed} it needs. Yours are not stored and not lost: choose whether to keep both.`;
}

/**
 * Holds a sending back that would take a cell beyond its need over readings its sender had not seen; null lets it go.
 * The cell is locked by the caller.
 */
export async function holdOver(
	ctx: Context,
	cell: NamedCell,
	{ run, fresh, needed, othersSeen }: Sending
): Promise<Refusal<'conflict'> | null> {
	if (fresh === 0 || othersSeen === null) return null;
	const counted = await readings.countedOfCell(ctx.db, cell);
	const others = counted.filter((row) => row.runId !== run);
	const total = counted.length + fresh;
	if (others.length <= othersSeen || total <= needed) return null;
	const unseen = [...others].sort((a, b) => a.id - b.id).slice(othersSeen);
	const testers = await runs.testersOf(ctx.db, [...new Set(unseen.map((row) => row.runId))]);
	const theirs = unseen.map((row) => ({
		id: row.id,
		value: row.value,
		by: testers.get(row.runId) ?? '',
		at: row.createdAt.toISOString()
	}));
	const detail: HeldOver = { kind: 'over', needed, othersSeen: others.length, theirs };
	return refuse('conflict', heldWords(theirs, total, needed), { detail });
}
