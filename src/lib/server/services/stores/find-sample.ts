import { codeIn, samplesByCode } from '../../../domain/stores/sample-code';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as samples from '../../db/queries/sample';

type Row = Awaited<ReturnType<typeof samples.list>>[number];

export interface FoundSamples {
	/** What was looked for: of an address on a label the sample's slug. */
	code: string;
	/** The one sample that the code names; null where it names none or several. */
	exact: Row | null;
	/** Those it may mean, at most twenty. */
	near: Row[];
}

/** Samples by what stands on their label or their box: code, serial number, or the address that the label leads to. */
export async function findSample(ctx: Context, text: string): Promise<Outcome<FoundSamples, 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const code = codeIn(text);
	if (code === '') return done({ code, exact: null, near: [] });
	const window = { limit: 20, offset: 0 };
	const [bySlug, bySerial, near] = await Promise.all([
		samples.byRefs(ctx.db, [code.toLowerCase()]),
		samples.bySerial(ctx.db, code),
		samples.list(ctx.db, { q: code, sort: 'code', way: 'up', ...window })
	]);
	const named = samplesByCode(code, [...bySlug, ...bySerial]);
	const [only] = named;
	if (only && named.every((row) => row.id === only.id)) return done({ code, exact: only, near: [] });
	return done({ code, exact: null, near: named.length > 0 ? named : near });
}
