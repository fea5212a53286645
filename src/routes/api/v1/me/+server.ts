import type { RequestEvent } from './$types';
import { json } from '$lib/server/http/api';
import { open } from '$lib/server/http/guarded';
import { notSignedIn } from '$lib/server/http/problem';

/** Open to any scope: a script asks it whether its token still works. */
export const GET = open((_event: RequestEvent, { actor }) => {
	if (!actor) return notSignedIn();
	const { name, email, roles, scopes = null } = actor;
	return json({ name, email, roles, scopes });
});
