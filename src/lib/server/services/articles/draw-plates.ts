import type { PlateSpec } from '../../../domain/articles/plates/spec';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { plateDrawing } from '../../rendering/plate-cache';

/** Drawings of plates for the preview, in the order they were asked for. Whoever asks already has every figure in them. */
export function drawPlates(
	ctx: Context,
	specs: PlateSpec[]
): Outcome<{ drawings: string[] }, 'forbidden' | 'invalid'> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	try {
		return done({ drawings: specs.map(plateDrawing) });
	} catch {
		return refuse('invalid', 'One of these plates cannot be drawn. Nothing was stored.');
	}
}
