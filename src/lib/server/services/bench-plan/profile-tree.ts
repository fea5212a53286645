import { chainTo } from '../../../domain/bench/profile';

/** Ids of a profile and of all that stand over it: whatever it sets, they inherit. */
export const withHeirs = (tree: { id: number; parentId: number | null }[], id: number): number[] =>
	tree.filter((one) => chainTo(tree, one.id).some((above) => above.id === id)).map((one) => one.id);
