import { sequence } from '@sveltejs/kit/hooks';
import { authHandle } from '$lib/server/auth/auth';
import { identify } from '$lib/server/auth/identify';

export const handle = sequence(authHandle, identify);
