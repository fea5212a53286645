import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as samples from '../../db/queries/sample';
import { drawQr, type DrawnQr } from '../../rendering/draw-qr';

export interface SampleLabel {
	slug: string;
	serial: string;
	maker: string;
	model: string;
	/** The sample's own address, which the code leads to. */
	address: string;
	qr: DrawnQr;
}

export interface Labels {
	/** In the order they were asked for. */
	labels: SampleLabel[];
	/** Codes of which there is no sample. */
	missing: string[];
}

/** Labels of samples, by slug or id. */
export async function drawLabels(ctx: Context, refs: string[]): Promise<Outcome<Labels, 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const asked = [...new Set(refs)];
	const found = await samples.byRefs(ctx.db, asked);
	const rows = asked.map((ref) => found.find((row) => row.slug === ref || String(row.id) === ref));
	return done({
		labels: rows.flatMap((row) => {
			if (!row) return [];
			const { slug, serial, maker, model } = row;
			const address = `${ctx.origin}/stores/samples/${slug}`;
			return [{ slug, serial, maker, model, address, qr: drawQr(address) }];
		}),
		missing: asked.filter((_, at) => !rows[at])
	});
}
