import { z } from 'zod';
import { loanMoves } from '../domain/stores/loan';
import { embargoFields } from '../domain/stores/words';
import { isCurrency } from '../domain/shared/money';
import { line, paragraphs, versionSeen } from './fields';

/** A day; empty for none. What comes out is what went in, so that a form can check it again. */
const optionalDate = z
	.string('Write the date as year-month-day.')
	.trim()
	.default('')
	.refine((text) => text === '' || z.iso.date().safeParse(text).success, 'Write the date as year-month-day.');

export const partnerInput = z.object({
	name: line(160).min(1, 'A partner needs a name.'),
	contactName: line(160).default(''),
	contactEmail: line(254)
		.default('')
		.refine((text) => text === '' || z.email().safeParse(text).success, 'This is not an e-mail address.'),
	notes: paragraphs(20_000).default('')
});
export type PartnerInput = z.output<typeof partnerInput>;
export const partnerEdit = partnerInput.extend({ version: versionSeen });

/** A decimal amount as people type it, such as 1 249.50 or 1249,50; the service turns it into minor units. */
const amount = line(40).default('');
const currency = z
	.string()
	.trim()
	.toUpperCase()
	.default('')
	.refine((code) => code === '' || isCurrency(code), 'Write a currency code of ISO 4217, such as EUR.');

export const loanInput = z
	.object({
		samples: z.array(z.string().min(1)).min(1, 'Choose at least one sample.'),
		askedOn: optionalDate,
		dueOn: optionalDate,
		terms: paragraphs(20_000).default(''),
		disclosure: paragraphs(1000).default(''),
		value: amount,
		currency
	})
	.refine((loan) => (loan.value === '') === (loan.currency === ''), {
		path: ['currency'],
		message: 'A value needs its currency, and a currency its value.'
	});
export type LoanInput = z.output<typeof loanInput>;

export const loanEdit = z
	.object({
		version: versionSeen,
		dueOn: optionalDate,
		terms: paragraphs(20_000).default(''),
		disclosure: paragraphs(1000).default(''),
		value: amount,
		currency
	})
	.refine((loan) => (loan.value === '') === (loan.currency === ''), {
		path: ['currency'],
		message: 'A value needs its currency, and a currency its value.'
	});
export type LoanEdit = z.output<typeof loanEdit>;

export const loanMoveInput = z.object({
	version: versionSeen,
	move: z.enum(loanMoves),
	/** The day it happened; today when left empty. */
	on: optionalDate,
	note: paragraphs(1000).default('')
});
export type LoanMoveInput = z.output<typeof loanMoveInput>;

export const embargoInput = z.object({
	sample: z.string().min(1, 'Choose the sample.'),
	field: z.enum(embargoFields),
	/** Local date and time in `zone`. */
	until: z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/, 'Write the date and the time.'),
	zone: z.string().trim().min(1, 'Name the time zone.').max(60),
	note: paragraphs(1000).default('')
});
export type EmbargoInput = z.output<typeof embargoInput>;

export const embargoLift = z.object({
	embargo: z.coerce.number().int().min(1),
	reason: paragraphs(1000).min(3, 'Say why it is lifted: the log keeps it.')
});
export type EmbargoLift = z.output<typeof embargoLift>;

/** What the list of partners takes from its address. */
export const partnersQuery = z.object({
	q: z.string().trim().max(200).default(''),
	page: z.coerce.number().int().min(1).max(100_000).default(1)
});

export const blankPartner: z.input<typeof partnerInput> = {
	name: '',
	contactName: '',
	contactEmail: '',
	notes: ''
};
export const blankLoan: z.input<typeof loanInput> = {
	samples: [],
	askedOn: '',
	dueOn: '',
	terms: '',
	disclosure: '',
	value: '',
	currency: ''
};
export const blankLoanEdit: z.input<typeof loanEdit> = {
	version: 1,
	dueOn: '',
	terms: '',
	disclosure: '',
	value: '',
	currency: ''
};
export const blankMove: z.input<typeof loanMoveInput> = { version: 1, move: 'promise', on: '', note: '' };
export const blankEmbargo: z.input<typeof embargoInput> = {
	sample: '',
	field: 'everything',
	until: '',
	zone: '',
	note: ''
};
export const blankLift: z.input<typeof embargoLift> = { embargo: 0, reason: '' };
