import { publicationInput } from '$lib/schemas/people';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readSettings } from '$lib/server/services/people/read-settings';
import { savePublication } from '$lib/server/services/people/save-publication';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = { name: '', zone: 'UTC', tagline: '', version: 0 };

export const load = guarded('settings.manage', async (_event: PageServerLoadEvent, ctx) => {
	const { name, zone, tagline, version } = valueOrError(await readSettings(ctx));
	return {
		title: 'Settings',
		form: await blankForm(publicationInput, { name, zone, tagline, version }),
		zones: ['UTC', ...Intl.supportedValuesOf('timeZone')]
	};
});

export const actions = {
	default: guarded('settings.manage', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, publicationInput, blank);
		if (!value) return refuseForm(form);
		const outcome = await savePublication(ctx, value);
		if (!outcome.ok) return refusedForm(form, outcome);
		form.data.version = value.version + 1;
		return { form, said: 'The settings are saved.' };
	})
};
