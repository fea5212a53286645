import { z } from 'zod';
import { roles, scopes } from '../../../domain/people/roles';
import { describe } from '../openapi';

export const about = [
	describe({
		method: 'get',
		path: '/api/v1/openapi.json',
		act: 'public',
		summary: 'This document',
		response: z.looseObject({ openapi: z.string() })
	}),
	describe({
		method: 'get',
		path: '/api/v1/me',
		act: 'public',
		summary: 'Who the token speaks for, and what it allows',
		response: z.object({
			name: z.string(),
			email: z.string(),
			roles: z.array(z.enum(roles)),
			scopes: z.array(z.enum(scopes)).nullable().describe('Null for a signed-in browser.')
		})
	})
];
