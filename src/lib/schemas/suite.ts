import { z } from 'zod';
import { chosenWorkloads } from './campaign';
import { line, optionalSlug, paragraphs, versionSeen } from './fields';
import { apiListing, listing } from './listing';

const suiteFields = {
	name: line(160).min(1, 'A suite needs a name.'),
	purpose: paragraphs(5000).default(''),
	workloads: chosenWorkloads.refine((rows) => rows.length > 0, 'Choose at least one workload.')
};

/** A standard set of workloads with their repeats, from which campaigns are planned. */
export const suiteInput = z.object({ ...suiteFields, slug: optionalSlug });
export type SuiteInput = z.output<typeof suiteInput>;
export type SuiteTyped = z.input<typeof suiteInput>;

export const suiteEdit = z.object({ ...suiteFields, version: versionSeen });
export type SuiteEdit = z.output<typeof suiteEdit>;
export type SuiteEditTyped = z.input<typeof suiteEdit>;

export const suiteArchive = z.object({ archived: z.enum(['yes', 'no']), version: versionSeen });
export type SuiteArchive = z.output<typeof suiteArchive>;

export const suitesQuery = listing(['name', 'newest']).extend({
	state: z.enum(['open', 'archived', 'all']).default('open')
});
export type SuitesQuery = z.output<typeof suitesQuery>;

export const suitesApiQuery = apiListing.extend({
	state: z.enum(['open', 'archived', 'all']).default('all')
});
export type SuitesApiQuery = z.output<typeof suitesApiQuery>;

interface Begun {
	name: string;
	purpose: string;
	workloads: readonly { slug: string; repeats: number }[];
}

/** A suite to fill in, with a line for each workload there is; those of `begin` are ticked. */
export const typedSuite = (
	offered: readonly { slug: string; repeats: number }[],
	begin: Begun | null = null
): Omit<SuiteTyped, 'slug'> => ({
	name: begin?.name ?? '',
	purpose: begin?.purpose ?? '',
	workloads: offered.map(({ slug, repeats }) => {
		const chosen = begin?.workloads.find((one) => one.slug === slug);
		return { workload: chosen ? slug : '', repeats: String(chosen?.repeats ?? repeats) };
	})
});
