import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { peopleQuery, rowInput } from '$lib/schemas/people';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readForm, refuseForm } from '$lib/server/http/read-form';
import { saidOrProblem } from '$lib/server/http/small-act';
import { listInvitations } from '$lib/server/services/people/list-invitations';
import { listPeople } from '$lib/server/services/people/list-people';
import { resendInvitation } from '$lib/server/services/people/resend-invitation';
import { revokeInvitation } from '$lib/server/services/people/revoke-invitation';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('people.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(peopleQuery, url.searchParams);
	const manages = may(ctx.actor, 'people.manage');
	const [found, invitations] = await Promise.all([
		listPeople(ctx, query),
		manages ? listInvitations(ctx) : null
	]);
	return {
		title: 'People',
		query,
		manages,
		...valueOrError(found),
		invitations: invitations ? valueOrError(invitations) : []
	};
});

export const actions = {
	resend: guarded('people.manage', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rowInput, { id: 0 });
		if (!value) return refuseForm(form);
		return saidOrProblem(
			await resendInvitation(ctx, value.id),
			'The invitation is on its way again, with a new link.'
		);
	}),
	revoke: guarded('people.manage', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rowInput, { id: 0 });
		if (!value) return refuseForm(form);
		return saidOrProblem(
			await revokeInvitation(ctx, value.id),
			'The invitation is taken back; its link no longer works.'
		);
	})
};
