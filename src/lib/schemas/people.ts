import { z } from 'zod';
import { roles, scopes } from '../domain/people/roles';
import { isZone } from '../domain/people/zone';
import { line, versionSeen } from './fields';

/** An address as it is stored: trimmed, in lower case. */
export const email = z
	.string()
	.trim()
	.toLowerCase()
	.min(1, 'Write an e-mail address.')
	.max(254, 'This is too long for an e-mail address.')
	.check(z.email('This is not an e-mail address.'));

const to = z.string().max(2000).default('');
const reason = line(500).min(1, 'Say why, in a few words.');
const personName = line(160).min(1, 'Write a name.');

/** A password that somebody chooses. Long rather than odd: length is what makes guessing hopeless. */
const newPassword = z
	.string()
	.min(12, 'Use at least 12 characters; a few words in a row are good.')
	.max(200, 'Use at most 200 characters.');

export const signInInput = z.object({
	email,
	password: z.string().min(1, 'Write your password.').max(200, 'Use at most 200 characters.'),
	to
});
export type SignInInput = z.output<typeof signInInput>;

export const linkInput = z.object({ email, to });

export const inviteInput = z.object({
	name: personName,
	email,
	roles: z.array(z.enum(roles)).min(1, 'Choose at least one role; without one nobody can sign in.')
});
export type InviteInput = z.output<typeof inviteInput>;

export const acceptInput = z.object({ name: personName, password: newPassword });
export type AcceptInput = z.output<typeof acceptInput>;

export const passwordInput = z.object({ password: newPassword });

export const passwordChange = z.object({
	current: z.string().min(1, 'Write the password you have now.').max(200),
	password: newPassword
});
export type PasswordChange = z.output<typeof passwordChange>;

export const nameInput = z.object({ name: personName, version: versionSeen });
export type NameInput = z.output<typeof nameInput>;

export const rolesInput = z.object({ roles: z.array(z.enum(roles)), version: versionSeen });
export type RolesInput = z.output<typeof rolesInput>;

export const leaveInput = z.object({ reason, version: versionSeen });
export type LeaveInput = z.output<typeof leaveInput>;

export const returnInput = z.object({ version: versionSeen });

export const tokenDays = ['30', '90', '365', 'never'] as const;

export const tokenInput = z.object({
	name: line(120).min(1, 'Name it after the machine or script that will use it.'),
	scopes: z.array(z.enum(scopes)).min(1, 'Choose at least one scope.'),
	days: z.enum(tokenDays)
});
export type TokenInput = z.output<typeof tokenInput>;

export const publicationInput = z.object({
	name: line(120).min(1, 'The publication needs a name.'),
	zone: line(60).refine(isZone, 'This is not a time zone. Write one such as Europe/Oslo.'),
	tagline: line(200),
	version: z.coerce.number<number>().int().min(0)
});
export type PublicationInput = z.output<typeof publicationInput>;

export const rowInput = z.object({ id: z.coerce.number<number>().int().positive() });
export const dropJobInput = rowInput.extend({ reason });
export type DropJobInput = z.output<typeof dropJobInput>;

/** Forms as they open. */
export const blankSignIn = { email: '', password: '', to: '' };
export const blankLink = { email: '', to: '' };
export const blankInvite: z.input<typeof inviteInput> = { name: '', email: '', roles: [] };
export const blankToken: z.input<typeof tokenInput> = { name: '', scopes: [], days: '90' };

/** The list of people, as its address says. */
export const peopleQuery = z.object({
	q: z.string().trim().max(200).default(''),
	role: z.union([z.literal(''), z.enum(roles)]).default(''),
	state: z.enum(['here', 'left', 'all']).default('here'),
	page: z.coerce.number().int().min(1).max(100_000).default(1)
});
export type PeopleQuery = z.output<typeof peopleQuery>;

const day = z.union([z.literal(''), z.iso.date()]).default('');

/** The audit log, as its address says; days are those of the publication's zone. */
export const auditQuery = z.object({
	who: z.string().max(36).default(''),
	act: z.string().trim().max(60).default(''),
	kind: z.string().max(40).default(''),
	id: z.string().trim().max(60).default(''),
	from: day,
	until: day,
	before: z.coerce.number().int().positive().optional()
});
export type AuditQuery = z.output<typeof auditQuery>;

export const pageQuery = z.object({ page: z.coerce.number().int().min(1).max(100_000).default(1) });
