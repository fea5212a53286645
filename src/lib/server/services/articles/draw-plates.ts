import { plateKey, type PlateSpec } from '../../../domain/articles/plates/spec';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { plateDrawing } from '../../rendering/plate-cache';

/** Drawings of plates for the preview, by their keys. Whoever asks already has every figure in them. */
export function drawPlates(
	ctx: Context,
	specs: PlateSpec[]
): Outcome<Record<string, string>, 'forbidden' | 'invalid'> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	try {
		return done(Object.fromEntries(specs.map((spec) => [plateKey(spec), plateDrawing(spec)])));
	} catch {
		return refuse('invalid', 'One of these plates cannot be drawn. Nothing was stored.');
	}
}
