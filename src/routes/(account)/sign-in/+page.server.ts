import { redirect } from '@sveltejs/kit';
import { homeOf } from '$lib/domain/people/home';
import { sameSitePath } from '$lib/domain/people/same-site';
import { blankLink, blankSignIn, linkInput, signInInput } from '$lib/schemas/people';
import { sendLink } from '$lib/server/auth/send-link';
import { startSession } from '$lib/server/auth/session-cookie';
import { open, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { setRetryAfter } from '$lib/server/http/retry-after';
import { askForLink } from '$lib/server/services/people/ask-for-link';
import { listDemoPeople } from '$lib/server/services/people/list-demo-people';
import { signInWithPassword } from '$lib/server/services/people/sign-in-with-password';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = open(async ({ url }: PageServerLoadEvent, ctx) => {
	const to = sameSitePath(url.searchParams.get('to'), '');
	if (ctx.actor) redirect(303, to || homeOf(ctx.actor));
	const [password, link, demo] = await Promise.all([
		blankForm(signInInput, { ...blankSignIn, to }, 'password'),
		blankForm(linkInput, { ...blankLink, to }, 'link'),
		listDemoPeople(ctx)
	]);
	return { title: 'Sign in', password, link, demo: valueOrError(demo), to };
});

export const actions = {
	password: open(async (event: RequestEvent, ctx) => {
		const { form, value } = await readForm(event.request, signInInput, blankSignIn, 'password');
		form.data.password = '';
		if (!value) return refuseForm(form);
		const outcome = await signInWithPassword(ctx, value, event.getClientAddress());
		if (!outcome.ok) {
			setRetryAfter(event, outcome);
			return refusedForm(form, outcome);
		}
		await startSession(ctx.db, event.cookies, outcome.value.userId);
		// Without a wish this page itself sends each to their own place.
		redirect(303, sameSitePath(value.to, '/sign-in'));
	}),
	link: open(async (event: RequestEvent, ctx) => {
		const { form, value } = await readForm(event.request, linkInput, blankLink, 'link');
		if (!value) return refuseForm(form);
		const outcome = await askForLink(ctx, value.email, event.getClientAddress());
		if (!outcome.ok) {
			setRetryAfter(event, outcome);
			return refusedForm(form, outcome);
		}
		if (outcome.value.send) await sendLink(ctx.origin, value.email, sameSitePath(value.to, '/sign-in'));
		return { form, sentTo: value.email };
	})
};
