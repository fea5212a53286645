import { z } from 'zod';
import { line, optionalSlug, paragraphs, reference, versionSeen } from './fields';
import { apiListing, listing } from './listing';

const name = line(160).min(1, 'A rig needs a name.');
/** By which the meanings of its settings are looked up; empty where its firmware is of no family of the list. */
const firmwareFamily = line(80).default('');

const revisionFields = {
	/** Slugs or ids, in the order the parts list prints them. */
	samples: z
		.array(reference('Choose a sample.'))
		.min(1, 'Choose the samples that the rig is made of.')
		.max(60, 'A rig has at most 60 samples.')
		.refine((refs) => new Set(refs).size === refs.length, 'A sample is in a rig once.'),
	firmware: line(160).default(''),
	driver: line(160).default(''),
	os: line(160).default('')
};

/** A rig with its first revision. Its profile tree starts with stock. */
export const rigInput = z.object({ name, slug: optionalSlug, firmwareFamily, ...revisionFields });
export type RigInput = z.output<typeof rigInput>;
export type RigTyped = z.input<typeof rigInput>;

/** The next revision of a rig: what it is now, and what changed, in words. */
export const rigRevise = z.object({
	version: versionSeen,
	...revisionFields,
	change: paragraphs(2000).min(1, 'Say what changed: readers of old results will ask.')
});
export type RigRevise = z.output<typeof rigRevise>;
export type RigReviseTyped = z.input<typeof rigRevise>;

/** A correction of the newest revision while nothing was measured on it. */
export const rigCorrect = z.object({ version: versionSeen, name, firmwareFamily, ...revisionFields });
export type RigCorrect = z.output<typeof rigCorrect>;
export type RigCorrectTyped = z.input<typeof rigCorrect>;

export const blankRig = (): RigTyped => ({
	name: '',
	slug: '',
	firmwareFamily: '',
	samples: [],
	firmware: '',
	driver: '',
	os: ''
});

/** What the list of rigs takes from its address. */
export const rigsQuery = listing(['name', 'revised', 'newest']).extend({
	/** Slug or id of a sample: the rigs that have it now. */
	sample: z.string().trim().max(80).optional()
});
export type RigsQuery = z.output<typeof rigsQuery>;

export const rigsApiQuery = apiListing.extend({
	sample: z.string().trim().max(80).optional().describe('Slug or id of a sample: the rigs that have it now.')
});
export type RigsApiQuery = z.output<typeof rigsApiQuery>;
