import type * as profiles from '../../db/queries/profile';

type Profile = Awaited<ReturnType<typeof profiles.ofRigs>>[number];

/** A profile's ancestors from stock down to itself. */
export function lineage(tree: Profile[], id: number): Profile[] {
	const byId = new Map(tree.map((profile) => [profile.id, profile]));
	const line: Profile[] = [];
	for (
		let at = byId.get(id);
		at && !line.includes(at);
		at = at.parentId === null ? undefined : byId.get(at.parentId)
	)
		line.unshift(at);
	return line;
}

/** Ids of a profile and of all that stand over it: whatever it sets, they inherit. */
export const withHeirs = (tree: Profile[], id: number): number[] =>
	tree
		.filter((profile) => lineage(tree, profile.id).some((one) => one.id === id))
		.map((profile) => profile.id);
