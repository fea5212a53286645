import { chainTo } from '../../../domain/bench/profile';
import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as knowledge from '../../db/queries/lab-knowledge';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';

type Row = Awaited<ReturnType<typeof profiles.ofRigs>>[number];

/** Each named profile with its line of descent, stock first; null where the rig has none of that name. */
async function linesOf(ctx: Context, tree: readonly Row[], slugs: readonly string[]) {
	const lines = slugs.map((slug) => {
		const found = tree.find((one) => one.slug === slug);
		return found ? { found, line: chainTo(tree, found.id) } : null;
	});
	const ids = lines.flatMap((one) => one?.line.map(({ id }) => id) ?? []);
	const settingsOf = grouped(
		await profiles.settingsOf(ctx.db, [...new Set(ids)]),
		(setting) => setting.profileId
	);
	return lines.map((one) =>
		one
			? {
					slug: one.found.slug,
					name: one.found.name,
					lineage: one.line.map(({ id }) => ({
						settings: (settingsOf.get(id) ?? []).map(({ profileId: _, ...setting }) => setting)
					}))
				}
			: null
	);
}

async function comparisonOf(
	ctx: Context,
	rig: { id: number; slug: string; name: string },
	a: string,
	b: string
) {
	const tree = await profiles.ofRigs(ctx.db, [rig.id]);
	const root = tree.find((one) => one.parentId === null);
	const sides = { a: a || (root?.slug ?? ''), b };
	const [[first = null, second = null], labOf] = await Promise.all([
		linesOf(ctx, tree, [sides.a, sides.b]),
		knowledge.ofRigs(ctx.db, [rig.id])
	]);
	return {
		rig: { slug: rig.slug, name: rig.name },
		lab: labOf(rig.id),
		profiles: tree.map(({ slug, name }) => ({ slug, name })),
		a: first,
		b: second,
		/** Names in the address that no profile of the rig has. */
		unknown: [first ? '' : sides.a, second ? '' : sides.b].filter((slug) => slug !== '')
	};
}

export type ProfileComparison = Awaited<ReturnType<typeof comparisonOf>>;

/** Any two profiles of a rig by slug, with all they inherit; without a first one, it is stock. */
export async function compareProfiles(
	ctx: Context,
	rigRef: string,
	a: string,
	b: string
): Promise<Outcome<ProfileComparison, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rig] = await rigs.byRefs(ctx.db, [rigRef]);
	return rig
		? done(await comparisonOf(ctx, rig, a, b))
		: refuse('not_found', `There is no rig “${rigRef}” on the bench.`);
}
