import { building } from '$app/environment';
import type { HandleServerError } from '@sveltejs/kit';
import { sequence } from '@sveltejs/kit/hooks';
import { database } from '$lib/server/app';
import { authHandle } from '$lib/server/auth/auth';
import { identify } from '$lib/server/auth/identify';
import { clock } from '$lib/server/clock';
import { env } from '$lib/server/env';
import { apiProblems } from '$lib/server/http/api-problems';
import { bodyLimit } from '$lib/server/http/body-limit';
import { requestLog } from '$lib/server/http/request-log';
import { sameOrigin } from '$lib/server/http/same-origin';
import { securityHeaders } from '$lib/server/http/security-headers';
import { theme } from '$lib/server/http/theme';
import { startWork } from '$lib/server/lifecycle';
import { log } from '$lib/server/log';
import { migrateDatabase } from '$lib/server/migrate';

/** Before the first request: the schema is brought up, the demo filled where it was asked for, the jobs begin. */
export async function init(): Promise<void> {
	if (building) return;
	const { DATABASE_URL, DEMO } = env();
	await migrateDatabase(DATABASE_URL);
	if (DEMO === 'on') {
		const { fillDemo } = await import('$lib/server/demo/fill');
		await fillDemo(database().db, clock.now());
	}
	startWork();
}

export const handle = sequence(
	requestLog,
	securityHeaders,
	sameOrigin,
	bodyLimit,
	theme,
	authHandle,
	identify,
	apiProblems
);

/** The person gets an id to name; the log has what happened under it. */
export const handleError: HandleServerError = ({ error, event, status, message }) => {
	if (status === 404) return { message: 'There is nothing at this address.' };
	const errorId = event.locals.requestId;
	log.error(
		{ errorId, route: event.route.id, error: error instanceof Error ? error.stack : String(error) },
		'a request failed'
	);
	return {
		message: status < 500 ? message : 'Something failed on our side. Nothing you typed was taken.',
		errorId
	};
};
