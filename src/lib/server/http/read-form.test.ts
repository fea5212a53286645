import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { versionSeen } from '../../schemas/fields';
import { readForm } from './read-form';

const schema = z.object({
	reason: z.string().min(1, 'Say why.'),
	roles: z.array(z.string()),
	version: versionSeen
});
const blank = { reason: '', roles: [], version: 1 };
const post = (form: [string, string][]) =>
	new Request('https://northlight.example/', { method: 'POST', body: new URLSearchParams(form) });

describe('a posted form', () => {
	it('that is refused keeps the version that was seen: its next save is over the same row', async () => {
		const { form, value } = await readForm(post([['version', '6']]), schema, blank);
		expect(value).toBeUndefined();
		expect(form.errors.reason).toEqual(['Say why.']);
		expect(form.data).toMatchObject({ reason: '', version: '6' });
	});

	it('that is good has the schema’s value beside what was typed', async () => {
		const typed: [string, string][] = [
			['reason', 'moved'],
			['roles[]', 'a'],
			['roles[]', 'b'],
			['version', '6']
		];
		const { form, value } = await readForm(post(typed), schema, blank);
		expect(value).toEqual({ reason: 'moved', roles: ['a', 'b'], version: 6 });
		expect(form.data.version).toBe('6');
	});
});
