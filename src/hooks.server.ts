import { sequence } from '@sveltejs/kit/hooks';
import { authHandle } from '$lib/server/auth/auth';
import { identify } from '$lib/server/auth/identify';
import { apiProblems } from '$lib/server/http/api-problems';
import { theme } from '$lib/server/http/theme';

export const handle = sequence(authHandle, identify, apiProblems, theme);
