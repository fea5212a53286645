import type { Actor } from '$lib/domain/people/roles';

declare global {
	namespace App {
		interface Locals {
			/** Who acts, read once in hooks.server.ts; null for a visitor. */
			actor: Actor | null;
			requestId: string;
		}
		interface Error {
			message: string;
			/** Shown to the person; the log has the rest under it. */
			errorId?: string;
		}
		interface PageData {
			title?: string;
		}
	}
}

export {};
