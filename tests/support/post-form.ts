import { isRedirect, type ActionFailure } from '@sveltejs/kit';
import type { SuperValidated } from 'sveltekit-superforms';
import type { Actor } from '../../src/lib/domain/people/roles';
import { fakeEvent } from './event';

export interface RefusedForm {
	status: number;
	form: SuperValidated<Record<string, unknown>, string>;
}

/** Posts a form as a browser without scripts does; where it leads, or the form that comes back. */
export async function postForm(
	actor: Actor,
	action: (event: never) => unknown,
	form: Record<string, string>,
	params: Record<string, string> = {}
): Promise<string | RefusedForm> {
	try {
		const event = fakeEvent({ path: '/x', form, params, actor });
		const failed = (await action(event as never)) as ActionFailure<{ form: RefusedForm['form'] }>;
		return { status: failed.status, form: failed.data.form };
	} catch (thrown) {
		if (isRedirect(thrown)) return thrown.location;
		throw thrown;
	}
}
