import { redirect } from '@sveltejs/kit';
import { homeOf } from '$lib/domain/people/home';
import { blankToken, nameInput, passwordChange, rowInput, tokenInput } from '$lib/schemas/people';
import { endSession, sessionCookie } from '$lib/server/auth/session-cookie';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { setRetryAfter } from '$lib/server/http/retry-after';
import { saidOrProblem } from '$lib/server/http/small-act';
import { changePassword } from '$lib/server/services/people/change-password';
import { createToken } from '$lib/server/services/people/create-token';
import { readSelf } from '$lib/server/services/people/read-self';
import { renameSelf } from '$lib/server/services/people/rename-self';
import { revokeToken } from '$lib/server/services/people/revoke-token';
import { signOutEverywhere } from '$lib/server/services/people/sign-out-everywhere';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blankPassword = { current: '', password: '' };

export const load = guarded('account.use', async (_event: PageServerLoadEvent, ctx) => {
	const self = valueOrError(await readSelf(ctx));
	const { name, version } = self.person;
	const [nameForm, passwordForm, tokenForm] = await Promise.all([
		blankForm(nameInput, { name, version }, 'name'),
		blankForm(passwordChange, blankPassword, 'password'),
		blankForm(tokenInput, blankToken, 'token')
	]);
	return { title: name, ...self, home: homeOf(ctx.actor), now: ctx.now, nameForm, passwordForm, tokenForm };
});

export const actions = {
	name: guarded('account.use', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, nameInput, { name: '', version: 1 }, 'name');
		if (!value) return refuseForm(form);
		const outcome = await renameSelf(ctx, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		form.data.version = value.version + 1;
		return { form, said: 'Your name is saved.' };
	}),
	password: guarded('account.use', async (event: RequestEvent, ctx) => {
		const { form, value } = await readForm(event.request, passwordChange, blankPassword, 'password');
		form.data = { ...blankPassword };
		if (!value) return refuseForm(form);
		const sessionToken = event.cookies.get(sessionCookie());
		const outcome = await changePassword(ctx, value, { address: event.getClientAddress(), sessionToken });
		if (outcome.ok) return { form, said: 'Your password is changed. Your other browsers are signed out.' };
		setRetryAfter(event, outcome);
		return refusedForm(form, outcome);
	}),
	token: guarded('account.use', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, tokenInput, blankToken, 'token');
		if (!value) return refuseForm(form);
		const outcome = await createToken(ctx, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		form.data = { ...blankToken };
		return { form, token: outcome.value.token, name: value.name };
	}),
	revoke: guarded('account.use', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rowInput, { id: 0 }, 'revoke');
		if (!value) return refuseForm(form);
		return saidOrProblem(await revokeToken(ctx, value.id), 'The token is revoked.');
	}),
	'sign-out-everywhere': guarded('account.use', async ({ cookies }: RequestEvent, ctx) => {
		valueOrError(await signOutEverywhere(ctx));
		await endSession(ctx.db, cookies);
		redirect(303, '/sign-in');
	})
};
