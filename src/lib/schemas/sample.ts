import { z } from 'zod';
import { partKinds, provenances } from '../domain/stores/words';
import { line, optionalSlug, reference, unchosen, versionSeen } from './fields';
import { apiListing, listing } from './listing';

const sampleFields = {
	serial: line(120).default(''),
	provenance: z.enum(provenances, 'Say how it came to you.'),
	condition: line(300).default(''),
	place: line(160).default('')
};

/** One physical unit of a part. The slug is the code on its label; left empty, it is the part's with the next number. */
export const sampleInput = z.object({
	part: reference('Choose the part that this is a unit of.'),
	slug: optionalSlug,
	...sampleFields
});
export type SampleInput = z.output<typeof sampleInput>;
export type SampleTyped = z.input<typeof sampleInput>;

export const sampleEdit = z.object({ ...sampleFields, version: versionSeen });
export type SampleEdit = z.output<typeof sampleEdit>;
export type SampleEditTyped = z.input<typeof sampleEdit>;

export const blankSample = (part: string): SampleTyped => ({
	part,
	slug: '',
	serial: '',
	provenance: unchosen(),
	condition: '',
	place: ''
});

/** What the list of samples takes from its address. */
export const samplesQuery = listing(['code', 'part', 'place', 'newest']).extend({
	provenance: z.enum(provenances).optional(),
	kind: z.enum(partKinds).optional(),
	/** Slug or id of a part. */
	part: z.string().trim().max(80).optional()
});
export type SamplesQuery = z.output<typeof samplesQuery>;

export const samplesApiQuery = apiListing.extend({
	provenance: z.enum(provenances).optional(),
	kind: z.enum(partKinds).optional(),
	part: z.string().trim().max(80).optional().describe('Slug or id of a part.')
});
export type SamplesApiQuery = z.output<typeof samplesApiQuery>;
