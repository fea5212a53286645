import { blankInvite, inviteInput } from '$lib/schemas/people';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { invitePerson } from '$lib/server/services/people/invite-person';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('people.manage', async (_event: PageServerLoadEvent) => ({
	title: 'Invite somebody',
	form: await blankForm(inviteInput, blankInvite)
}));

export const actions = {
	default: guarded('people.manage', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, inviteInput, blankInvite);
		if (!value) return refuseForm(form);
		const outcome = await invitePerson(ctx, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		form.data = { ...blankInvite };
		return { form, sentTo: value.email };
	})
};
