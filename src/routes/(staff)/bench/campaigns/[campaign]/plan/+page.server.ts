import { fail, redirect } from '@sveltejs/kit';
import type { Outcome } from '$lib/domain/shared/outcome';
import {
	campaignArchive,
	campaignEdit,
	campaignExtend,
	campaignInstrument,
	campaignRepeats,
	campaignTrim
} from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { statusOf } from '$lib/server/http/problem';
import { archiveCampaign, editCampaign } from '$lib/server/services/bench/edit-campaign';
import { extendCampaign, setRepeats, trimCampaign } from '$lib/server/services/bench/extend-campaign';
import { nameInstrument } from '$lib/server/services/bench/name-instrument';
import { readPlan } from '$lib/server/services/bench/read-plan';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blankEdit = { name: '', purpose: '', dueOn: '', version: 1 };
const blankExtend = { profiles: [], workloads: [], version: 1 };

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const plan = valueOrError(await readPlan(ctx, params.campaign));
	const { name, purpose, version } = plan.head;
	const edit = { name, purpose, dueOn: plan.dueOn, version };
	const lines = plan.moreWorkloads.map(({ repeats }) => ({ workload: '', repeats: String(repeats) }));
	return {
		title: `Plan of ${name}`,
		plan,
		edit: await blankForm(campaignEdit, edit, 'edit'),
		extend: await blankForm(campaignExtend, { profiles: [], workloads: lines, version }, 'extend')
	};
});

/** Back to the plan, or the refusal in words. */
function answer(outcome: Outcome<{ slug: string }>) {
	if (!outcome.ok) return fail(statusOf(outcome.reason), { refused: outcome.message });
	redirect(303, `/bench/campaigns/${outcome.value.slug}/plan`);
}

export const actions = {
	edit: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, campaignEdit, blankEdit, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editCampaign(ctx, params.campaign, value);
		return edited.ok ? answer(edited) : refusedForm(form, edited);
	}),
	extend: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, campaignExtend, blankExtend, 'extend');
		if (!value) return refuseForm(form);
		const extended = await extendCampaign(ctx, params.campaign, value);
		return extended.ok ? answer(extended) : refusedForm(form, extended);
	}),
	trim: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, campaignTrim);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		return answer(await trimCampaign(ctx, params.campaign, value));
	}),
	repeats: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, campaignRepeats);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		return answer(await setRepeats(ctx, params.campaign, value));
	}),
	instrument: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, campaignInstrument);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		return answer(await nameInstrument(ctx, params.campaign, value));
	}),
	archive: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, campaignArchive);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		return answer(await archiveCampaign(ctx, params.campaign, value));
	})
};
