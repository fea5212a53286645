import { redirect } from '@sveltejs/kit';
import { passwordInput } from '$lib/schemas/people';
import { startSession } from '$lib/server/auth/session-cookie';
import { open } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPasswordLink, setPasswordByLink } from '$lib/server/services/people/set-password-by-link';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = open(async ({ params }: PageServerLoadEvent, ctx) => {
	const found = await readPasswordLink(ctx, params.link);
	const form = await blankForm(passwordInput, { password: '' });
	return {
		title: found.ok ? 'Set a password' : 'This link does not work',
		person: found.ok ? found.value : null,
		problem: found.ok ? '' : found.message,
		form
	};
});

export const actions = {
	default: open(async ({ params, request, cookies }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, passwordInput, { password: '' });
		form.data.password = '';
		if (!value) return refuseForm(form);
		const outcome = await setPasswordByLink(ctx, params.link, value.password);
		if (!outcome.ok) return refusedForm(form, outcome);
		await startSession(ctx.db, cookies, outcome.value.userId);
		redirect(303, '/sign-in');
	})
};
