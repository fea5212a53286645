import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { ProfileEdit, SettingInput } from '../../../schemas/profile';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as profiles from '../../db/queries/profile';
import * as rigs from '../../db/queries/rig';
import { withHeirs } from './profile-tree';

const keys = ['menuPath', 'setting', 'value', 'unit', 'quantity', 'note'] as const;

const same = (a: SettingInput[], b: SettingInput[]) =>
	a.length === b.length && a.every((row, i) => keys.every((key) => row[key] === b[i]?.[key]));

/**
 * Changes a profile over the version that was seen. Once it, or a profile over it, was measured, its settings stay:
 * they say what the stored readings were measured with.
 */
export async function editProfile(
	ctx: Context,
	rigRef: string,
	ref: string,
	{ version, name, notes, settings }: ProfileEdit
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change profiles.');
	return inTransaction(ctx.db, async (tx) => {
		const [rig] = await rigs.byRefs(tx, [rigRef]);
		const [profile] = rig ? await profiles.byRefs(tx, rig.id, [ref]) : [];
		if (!profile) return refuse('not_found', `There is no profile “${ref}” of the rig “${rigRef}”.`);
		const heirs = withHeirs(await profiles.ofRigs(tx, [profile.rigId]), profile.id);
		await profiles.lock(tx, heirs);
		const before = (await profiles.settingsOf(tx, [profile.id])).map(
			({ profileId: _, ...setting }) => setting
		);
		const changes = !same(before, settings);
		if (changes && (await profiles.measured(tx, heirs)).size > 0)
			return refuse(
				'conflict',
				'Nothing was saved: runs were measured with these settings, so they stay as they are. Copy them to a new profile and change that one.'
			);
		if (!(await profiles.update(tx, profile.id, version, { name, notes })))
			return changedMeanwhile('profile', profile.version);
		if (changes) await profiles.replaceSettings(tx, profile.id, settings);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'profile.edit',
				subjectKind: 'profile',
				subjectId: profile.id,
				before: { name: profile.name, notes: profile.notes, settings: before },
				after: { name, notes, settings }
			}
		]);
		return done({ slug: profile.slug });
	});
}
