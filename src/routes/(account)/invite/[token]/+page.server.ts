import { redirect } from '@sveltejs/kit';
import { acceptInput } from '$lib/schemas/people';
import { startSession } from '$lib/server/auth/session-cookie';
import { open } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { acceptInvitation, readInvitation } from '$lib/server/services/people/accept-invitation';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = open(async ({ params }: PageServerLoadEvent, ctx) => {
	const found = await readInvitation(ctx, params.token);
	const name = found.ok ? found.value.name : '';
	return {
		title: found.ok ? 'Welcome' : 'This invitation does not work',
		invitation: found.ok ? found.value : null,
		problem: found.ok ? '' : found.message,
		form: await blankForm(acceptInput, { name, password: '' })
	};
});

export const actions = {
	default: open(async ({ params, request, cookies }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, acceptInput, { name: '', password: '' });
		form.data.password = '';
		if (!value) return refuseForm(form);
		const outcome = await acceptInvitation(ctx, params.token, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		await startSession(ctx.db, cookies, outcome.value.userId);
		redirect(303, '/sign-in');
	})
};
