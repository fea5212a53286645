import { readListing } from '$lib/schemas/listing';
import { dropJobInput, pageQuery, rowInput } from '$lib/schemas/people';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readForm } from '$lib/server/http/read-form';
import { saidOrProblem } from '$lib/server/http/small-act';
import { refuse } from '$lib/domain/shared/outcome';
import { dropJob } from '$lib/server/services/people/drop-job';
import { listDeadJobs } from '$lib/server/services/people/list-dead-jobs';
import { retryJob } from '$lib/server/services/people/retry-job';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('jobs.manage', async ({ url }: PageServerLoadEvent, ctx) => {
	const { page } = readListing(pageQuery, url.searchParams);
	return { title: 'Stuck jobs', ...valueOrError(await listDeadJobs(ctx, page)) };
});

const incomplete = refuse('invalid', 'Nothing was changed: say in a few words why the job is dropped.');

export const actions = {
	retry: guarded('jobs.manage', async ({ request }: RequestEvent, ctx) => {
		const { value } = await readForm(request, rowInput, { id: 0 });
		return saidOrProblem(value ? await retryJob(ctx, value.id) : incomplete, 'The job is tried again now.');
	}),
	drop: guarded('jobs.manage', async ({ request }: RequestEvent, ctx) => {
		const { value } = await readForm(request, dropJobInput, { id: 0, reason: '' });
		return saidOrProblem(
			value ? await dropJob(ctx, value) : incomplete,
			'The job is dropped. The audit log says why.'
		);
	})
};
