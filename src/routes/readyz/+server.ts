import { json } from '@sveltejs/kit';
import { open } from '$lib/server/http/guarded';
import { readiness } from '$lib/server/readiness';

/** Ready to serve: the database, the mail server and the job runner answer, and the process is not ending. */
export const GET = open(async () => {
	const state = await readiness();
	return json(state, { status: state.ready ? 200 : 503, headers: { 'cache-control': 'no-store' } });
});
