import { blankLink, linkInput } from '$lib/schemas/people';
import { open } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { setRetryAfter } from '$lib/server/http/retry-after';
import { askForPasswordLink } from '$lib/server/services/people/ask-for-password-link';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = open(async (_event: PageServerLoadEvent, { actor }) => ({
	title: 'Set a new password',
	link: await blankForm(linkInput, { ...blankLink, email: actor?.email ?? '' }, 'link')
}));

export const actions = {
	default: open(async (event: RequestEvent, ctx) => {
		const { form, value } = await readForm(event.request, linkInput, blankLink, 'link');
		if (!value) return refuseForm(form);
		const outcome = await askForPasswordLink(ctx, value.email, event.getClientAddress());
		if (outcome.ok) return { form, sentTo: value.email };
		setRetryAfter(event, outcome);
		return refusedForm(form, outcome);
	})
};
