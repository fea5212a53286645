import { createHash } from 'node:crypto';
import type { BoardNews, MovingBoard } from '../../../domain/bench/board-news';
import { bounded } from '../../bounded';

/** A board but for what depends on who looks, and at which cell. */
type Everybodys = Omit<MovingBoard, 'tag' | 'selected' | 'may' | 'newest'>;

export interface Snapshot {
	tag: string;
	/** The plan and all else that news do not tell: other boards are read anew. */
	plan: string;
	off: string;
	cells: string[];
}

/** Boards of a campaign from which news are told; whoever has an older one reads it anew. */
const mostSnapshots = 24;
const mostCampaigns = 12;

/**
 * A board as text. Its tag is made of the text, so that another process, or this one after a restart, gives the same
 * board the same tag.
 * @param plan what of the board is not told as news
 * @param before the last one, whose texts are taken over where they are the same
 */
export function snapshotOf({ cells, ...moving }: Everybodys, plan: unknown, before?: Snapshot): Snapshot {
	const texts = cells.map((cell, at) => {
		const text = JSON.stringify(cell);
		const old = before?.cells[at];
		return old === text ? old : text;
	});
	const snapshot = { plan: JSON.stringify(plan), off: JSON.stringify(moving.off), cells: texts };
	const hash = createHash('sha256').update(snapshot.plan).update('\n').update(JSON.stringify(moving));
	for (const text of texts) hash.update('\n').update(text);
	return { ...snapshot, tag: hash.digest('base64url').slice(0, 22) };
}

/** The cells and the rig's state that are other than in an earlier board; null where the plan is another. */
export function changedSince(
	before: Snapshot | undefined,
	now: Snapshot,
	board: Pick<MovingBoard, 'cells' | 'off'>
): Pick<Extract<BoardNews, { kind: 'changed' }>, 'cells' | 'off'> | null {
	if (!before || before.plan !== now.plan || before.cells.length !== now.cells.length) return null;
	return {
		cells: board.cells.flatMap((cell, at) => (before.cells[at] === now.cells[at] ? [] : [{ at, cell }])),
		...(before.off === now.off ? {} : { off: board.off })
	};
}

/** The boards of late that a process handed out, by campaign. */
export function recentSnapshots() {
	const of = bounded<number, Snapshot[]>(mostCampaigns);
	return {
		last: (campaign: number) => of(campaign, () => []).at(-1),
		find: (campaign: number, tag: string) => of(campaign, () => []).find((one) => one.tag === tag),
		keep(campaign: number, snapshot: Snapshot) {
			const list = of(campaign, () => []);
			const at = list.findIndex((one) => one.tag === snapshot.tag);
			if (at >= 0) list.splice(at, 1);
			list.push(snapshot);
			if (list.length > mostSnapshots) list.shift();
		}
	};
}
