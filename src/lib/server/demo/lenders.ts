import {
	embargoInput,
	embargoLift,
	loanInput,
	loanMoveInput,
	partnerInput,
	type EmbargoInput
} from '../../schemas/partner';
import type { LoanMove } from '../../domain/stores/loan';
import { done } from '../../domain/shared/outcome';
import * as loans from '../db/queries/loan';
import { moveLoan } from '../services/partners/move-loan';
import { askForLoan } from '../services/partners/save-loan';
import { addPartner } from '../services/partners/save-partner';
import { liftEmbargo, setEmbargo } from '../services/partners/set-embargo';
import { remindOfLoans } from '../services/partners/remind-of-loans';
import { kept, type Act, type World } from './act';
import { demoZone } from './calendar';

interface Held {
	on: number;
	sample: string;
	field: EmbargoInput['field'];
	until: [day: number, time: string];
	note: string;
	lifted?: { on: number; reason: string };
}

interface Lent {
	name: string;
	partner: string;
	samples: string[];
	askedOn: number;
	dueOn: number | null;
	terms: string;
	disclosure: string;
	value: string;
	moves: [day: number, move: LoanMove, note: string][];
	embargoes?: Held[];
}

const partners = [
	{
		name: 'Aldermoor',
		contactName: 'Vesna Kolar',
		contactEmail: 'press@aldermoor.example',
		notes:
			'Answers within a day. Sends processors in plain boxes; the label on the tray is the serial that counts.'
	},
	{
		name: 'Hollin',
		contactName: 'Dag Werring',
		contactEmail: 'samples@hollin.example',
		notes: 'Wants boards back in their antistatic bag. Extends a loan if asked a week before.'
	},
	{
		name: 'Marlow',
		contactName: 'Ilse Brandt',
		contactEmail: 'media@marlow.example',
		notes: 'Embargoes are for the minute, in Oslo time. No mention in feeds before it.'
	},
	{
		name: 'Brisk Cooling',
		contactName: 'Petra Almqvist',
		contactEmail: 'lab@brisk.example',
		notes: ''
	},
	{
		name: 'Tarn Storage',
		contactName: 'Rafe Lindgren',
		contactEmail: 'hello@tarn.example',
		notes: 'Does not want drives back once they were written to.'
	}
];

const lent: Lent[] = [
	{
		name: 'the 1650',
		partner: 'aldermoor',
		samples: ['n-101'],
		askedOn: -67,
		dueOn: 5,
		terms: 'Ninety days or less. No delidding. Results before the date of sale are under embargo.',
		disclosure:
			'Aldermoor lent us the processor. It saw the table of specifications before print, to check it for facts, and nothing else.',
		value: '709.00',
		moves: [
			[-65, 'promise', ''],
			[-62, 'send', 'By courier, signature asked for.'],
			[-60, 'receive', 'Seal whole. Photographed.']
		],
		embargoes: [
			{
				on: -60,
				sample: 'n-101',
				field: 'results',
				until: [-26, '15:00'],
				note: 'Date of sale.'
			}
		]
	},
	{
		name: 'the Forge X',
		partner: 'hollin',
		samples: ['n-102'],
		askedOn: -67,
		dueOn: -4,
		terms: 'Back in the antistatic bag it came in, with the screws.',
		disclosure: 'Hollin lent us the board and had no say in what we measured or wrote.',
		value: '429.00',
		moves: [
			[-64, 'promise', ''],
			[-61, 'receive', 'One scratch under the lower slot, photographed before anything was fitted.']
		]
	},
	{
		name: 'the Tower 14',
		partner: 'brisk-cooling',
		samples: ['m-204'],
		askedOn: -53,
		dueOn: -20,
		terms: 'One month. Paste may stay on it.',
		disclosure: 'Brisk lent us the cooler for a month.',
		value: '92.00',
		moves: [
			[-51, 'promise', ''],
			[-50, 'send', ''],
			[-46, 'receive', 'Fins bent at one corner on arrival; Brisk told the same day.'],
			[-23, 'send-back', 'By post, with both fans.'],
			[-21, 'return', 'Petra Almqvist confirmed that it came.']
		]
	},
	{
		name: 'the S4',
		partner: 'tarn-storage',
		samples: ['g-302'],
		askedOn: -36,
		dueOn: null,
		terms: 'No return asked for.',
		disclosure: 'Tarn gave us the drive and asked for nothing in return.',
		value: '158.00',
		moves: [
			[-31, 'receive', ''],
			[-28, 'keep', 'Offered in writing; the letter is in the folder.']
		]
	},
	{
		name: 'the G70',
		partner: 'marlow',
		samples: ['g-301'],
		askedOn: -25,
		dueOn: 24,
		terms: 'Not to be opened. Not to be shown with its board bare.',
		disclosure:
			'Marlow supplied the card before it was on sale and gets it back. It asked for nothing to be left out, and saw no figure of ours.',
		value: '749.00',
		moves: [
			[-21, 'promise', ''],
			[-18, 'send', ''],
			[-15, 'receive', 'Firmware on the card is dated; noted with the rig.']
		],
		embargoes: [
			{
				on: -15,
				sample: 'g-301',
				field: 'everything',
				until: [3, '14:00'],
				note: 'Date of sale. No mention in feeds before it.'
			},
			{
				on: -15,
				sample: 'g-301',
				field: 'specification',
				until: [3, '14:00'],
				note: '',
				lifted: { on: -8, reason: 'Marlow printed the specification itself on this day.' }
			}
		]
	},
	{
		name: 'the second G50',
		partner: 'marlow',
		samples: ['s-402'],
		askedOn: -9,
		dueOn: 40,
		terms: 'For a test of two cards of one model.',
		disclosure: 'Marlow lent us one of the two cards; the other we bought.',
		value: '419.00',
		moves: [
			[-5, 'promise', ''],
			[-1, 'send', 'By courier, two days.']
		]
	},
	{
		name: 'the 420',
		partner: 'brisk-cooling',
		samples: ['s-403'],
		askedOn: -2,
		dueOn: null,
		terms: '',
		disclosure: '',
		value: '',
		moves: []
	}
];

const partnersIn = ({ calendar }: World): Act[] =>
	partners.map((partner): Act => ({
		at: calendar.at(-68, '10:00'),
		who: 'Jonas',
		what: `partner ${partner.name}`,
		run: (ctx) => addPartner(ctx, partnerInput.parse(partner))
	}));

function asked(world: World, loan: Lent): Act {
	const { calendar } = world;
	const { name, partner, samples, askedOn, dueOn, terms, disclosure, value } = loan;
	return {
		at: calendar.at(askedOn, '10:15'),
		who: 'Jonas',
		what: `asking for ${name}`,
		run: async (ctx) => {
			const outcome = await askForLoan(
				ctx,
				partner,
				loanInput.parse({
					samples,
					askedOn: calendar.date(askedOn),
					dueOn: dueOn === null ? '' : calendar.date(dueOn),
					terms,
					disclosure,
					value,
					currency: value === '' ? '' : 'EUR'
				})
			);
			if (outcome.ok) world.loans.set(name, outcome.value.id);
			return outcome;
		}
	};
}

const moved = ({ calendar, loans: ids }: World, { name, moves }: Lent): Act[] =>
	moves.map(([day, move, note]): Act => ({
		at: calendar.at(day, '14:05'),
		who: 'Jonas',
		what: `${move} ${name}`,
		run: async (ctx) => {
			const id = kept(ids, name);
			const version = (await loans.byId(ctx.db, id))?.loan.version ?? 0;
			return moveLoan(ctx, id, loanMoveInput.parse({ version, move, on: calendar.date(day), note }));
		}
	}));

const held = ({ calendar, loans: ids }: World, { name, embargoes = [] }: Lent): Act[] =>
	embargoes.flatMap(({ on, sample, field, until, note, lifted }): Act[] => {
		const key = `embargo/${name}/${field}`;
		const set: Act = {
			at: calendar.at(on, '14:30'),
			who: 'Jonas',
			what: `embargo on ${sample}`,
			run: async (ctx) => {
				const outcome = await setEmbargo(
					ctx,
					kept(ids, name),
					embargoInput.parse({ sample, field, until: calendar.local(...until), zone: demoZone, note })
				);
				if (outcome.ok) ids.set(key, outcome.value.id);
				return outcome;
			}
		};
		if (!lifted) return [set];
		return [
			set,
			{
				at: calendar.at(lifted.on, '09:10'),
				who: 'Jonas',
				what: `lifting of the embargo on ${sample}`,
				run: (ctx) =>
					liftEmbargo(
						ctx,
						kept(ids, name),
						embargoLift.parse({ embargo: kept(ids, key), reason: lifted.reason })
					)
			}
		];
	});

/** The reminders as they went out on the mornings that called for one. */
const reminders = ({ calendar }: World): Act[] =>
	[-34, -23, -18, -9, -7, -4].map((day): Act => ({
		at: calendar.at(day, '07:00'),
		who: 'Jonas',
		what: 'reminders',
		run: async ({ db, now, origin }) => done(await remindOfLoans({ db, now, origin }))
	}));

/** Partners, what they lent us, and what comes with it. */
export const lenders = (world: World): Act[] => [
	...partnersIn(world),
	...lent.flatMap((loan) => [asked(world, loan), ...moved(world, loan), ...held(world, loan)]),
	...reminders(world)
];
