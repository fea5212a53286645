import { z } from 'zod';

const slug = z.string().trim().max(160).optional().catch(undefined);
const day = z.iso.date().optional().catch(undefined);
const several = z.array(z.string().trim().max(160)).max(60).catch([]);

/** What the explorer is asked for; what cannot be read is as if it were not asked. */
export const exploreQuery = z.object({
	part: slug,
	rig: slug,
	over: slug,
	from: day,
	to: day,
	plate: z.enum(['scores', 'gains']).catch('gains'),
	profile: several,
	workload: several
});
export type ExploreQuery = z.infer<typeof exploreQuery>;

/** The query of an address, fields that may stand several times as lists, empty ones left out. */
export function exploreAsked(params: URLSearchParams): ExploreQuery {
	const one = (name: string) => params.get(name)?.trim() || undefined;
	const all = (name: string) => params.getAll(name).filter((value) => value !== '');
	return exploreQuery.parse({
		part: one('part'),
		rig: one('rig'),
		over: one('over'),
		from: one('from'),
		to: one('to'),
		plate: one('plate'),
		profile: all('profile'),
		workload: all('workload')
	});
}
