import { leaveInput, returnInput, rolesInput } from '$lib/schemas/people';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { saidOrProblem } from '$lib/server/http/small-act';
import { bringBack } from '$lib/server/services/people/bring-back';
import { markLeft } from '$lib/server/services/people/mark-left';
import { readPerson } from '$lib/server/services/people/read-person';
import { setRoles } from '$lib/server/services/people/set-roles';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('people.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const { person: shown, ...found } = valueOrError(await readPerson(ctx, params.id));
	const { name, version } = shown;
	const [rolesForm, leaveForm] = await Promise.all([
		blankForm(rolesInput, { roles: found.roles, version }, 'roles'),
		blankForm(leaveInput, { reason: '', version }, 'leave')
	]);
	return { title: name, shown, ...found, isSelf: ctx.actor.id === shown.id, rolesForm, leaveForm };
});

export const actions = {
	roles: guarded('people.manage', async ({ params, request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rolesInput, { roles: [], version: 1 }, 'roles');
		if (!value) return refuseForm(form);
		const outcome = await setRoles(ctx, params.id, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		form.data.version = value.version + 1;
		return { form, said: 'The roles are saved. They hold from the next click on.' };
	}),
	leave: guarded('people.manage', async ({ params, request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, leaveInput, { reason: '', version: 1 }, 'leave');
		if (!value) return refuseForm(form);
		const outcome = await markLeft(ctx, params.id, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		return { form, said: 'Marked as left. Their sessions and tokens have ended.' };
	}),
	return: guarded('people.manage', async ({ params, request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, returnInput, { version: 1 }, 'return');
		if (!value) return refuseForm(form);
		return saidOrProblem(await bringBack(ctx, params.id, value.version), 'They can sign in again.');
	})
};
