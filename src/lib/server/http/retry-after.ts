import type { RequestEvent } from '@sveltejs/kit';
import type { Refusal } from '../../domain/shared/outcome';

/** Says in a header, too, when a full limit opens again. */
export function setRetryAfter(event: RequestEvent, refusal: Refusal): void {
	const detail = refusal.detail;
	if (refusal.reason !== 'too_many' || typeof detail !== 'object' || detail === null) return;
	if ('retryAfterSeconds' in detail) event.setHeaders({ 'retry-after': String(detail.retryAfterSeconds) });
}
