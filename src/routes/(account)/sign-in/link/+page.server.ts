import { sameSitePath } from '$lib/domain/people/same-site';
import { blankLink, linkInput } from '$lib/schemas/people';
import { open } from '$lib/server/http/guarded';
import { blankForm } from '$lib/server/http/read-form';
import type { PageServerLoadEvent } from './$types';

const words: Record<string, string> = {
	Verification: 'It was used already, or more than an hour has passed since it was sent.',
	AccessDenied: 'The address it was sent to can no longer sign in here. Ask an admin.'
};

export const load = open(async ({ url }: PageServerLoadEvent) => {
	const email = url.searchParams.get('email') ?? '';
	const token = url.searchParams.get('token') ?? '';
	const error = url.searchParams.get('error');
	const broken = error ?? (email && token ? null : 'Configuration');
	return {
		title: broken === null ? 'Sign in' : 'This link does not work',
		problem:
			broken === null
				? null
				: (words[broken] ?? 'Parts of its address are missing. Copy the whole of it from the mail.'),
		email,
		token,
		to: sameSitePath(url.searchParams.get('to'), '/sign-in'),
		link: await blankForm(linkInput, { ...blankLink, email }, 'link')
	};
});
