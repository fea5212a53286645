import { ladderInput } from '../../../schemas/ladder';
import { attemptInput } from '../../../schemas/stability';
import { createLadder } from '../../services/stability/create-ladder';
import { recordAttempts } from '../../services/stability/record-attempts';
import { voidAttempt } from '../../services/stability/void-attempt';
import { kept, type Act, type World } from '../act';

const slug = 'aldermoor-1650-by-hand';
const heavy = 'heat-soak';
const everyday = 'tile-render';

/** Day, time, clock, volts, stress, minutes, what was seen when it failed, errors, hottest core, package power. */
type Row = [
	day: number,
	time: string,
	clockMHz: number,
	volts: number,
	stress: string,
	minutes: number,
	failure: string,
	errors: number,
	peakTempC: number,
	packageW: number
];

const rows: Row[] = [
	[-43, '17:20', 4700, 1.16, heavy, 30, '', 0, 73, 179.4],
	[-43, '17:55', 4800, 1.16, heavy, 11, 'error', 2, 74, 181.7],
	[-43, '18:10', 4800, 1.19, heavy, 30, '', 0, 75, 189.8],
	[-43, '18:50', 4900, 1.19, heavy, 4, 'crash', 0, 76, 192.3],
	[-42, '09:15', 4900, 1.22, heavy, 30, '', 0, 77, 200.2],
	[-42, '09:55', 5000, 1.24, heavy, 9, 'restart', 0, 79, 209.4],
	[-42, '10:10', 4950, 1.24, heavy, 30, '', 0, 79, 207.1],
	[-42, '10:50', 5000, 1.28, heavy, 30, '', 0, 82, 220.6],
	[-42, '11:30', 5050, 1.28, heavy, 6, 'error', 1, 82, 221.5],
	[-41, '09:10', 4900, 1.19, everyday, 20, '', 0, 66, 163.2],
	[-41, '09:35', 5000, 1.24, everyday, 20, '', 0, 69, 176.8],
	[-41, '10:00', 5050, 1.24, everyday, 20, '', 0, 70, 178.1],
	[-41, '10:25', 5100, 1.24, everyday, 6, 'freeze', 0, 70, 179.6],
	[-41, '10:40', 5075, 1.24, everyday, 8, '', 0, 70, 178.9]
];

const recorded = ({ calendar }: World, row: Row, index: number): Act => {
	const [day, time, clockMHz, volts, stress, durationMin, failure, errors, peakTempC, packageW] = row;
	const began = calendar.at(day, time);
	return {
		at: new Date(began.getTime() + (durationMin + 1) * 60_000),
		who: 'Tomas',
		what: `attempt ${index + 1} of ${slug}`,
		run: (ctx) =>
			recordAttempts(ctx, slug, [
				attemptInput.parse({
					stress,
					clockMHz,
					volts,
					durationMin,
					outcome: failure === '' ? 'passed' : 'failed',
					failure,
					errors,
					peakTempC,
					packageW,
					ambientC: 21.2,
					startedAt: began.toISOString()
				})
			])
	};
};

/** One that was no attempt at all: the board had lost the profile. */
const voidedActs = ({ calendar, attempts }: World): Act[] => [
	{
		at: calendar.at(-42, '12:20'),
		who: 'Tomas',
		what: `attempt to be voided on ${slug}`,
		run: async (ctx) => {
			const outcome = await recordAttempts(ctx, slug, [
				attemptInput.parse({
					stress: heavy,
					clockMHz: 5050,
					volts: 1.24,
					durationMin: 30,
					outcome: 'passed',
					peakTempC: 71,
					packageW: 171.3,
					startedAt: calendar.at(-42, '11:45').toISOString()
				})
			]);
			const id = outcome.ok ? outcome.value.attempts[0]?.id : undefined;
			if (id !== undefined) attempts.set(slug, id);
			return outcome;
		}
	},
	{
		at: calendar.at(-42, '12:40'),
		who: 'Tomas',
		what: `void on ${slug}`,
		run: (ctx) =>
			voidAttempt(ctx, slug, {
				attempt: kept(attempts, slug),
				reason: 'The board had fallen back to stock over the restart: clocks in the log show 4400.'
			})
	}
];

/** A ladder for the fixed clock of the main rig: two stresses, some failures, one attempt voided. */
export const ladderActs = (world: World): Act[] => [
	{
		at: world.calendar.at(-43, '17:00'),
		who: 'Tomas',
		what: `ladder ${slug}`,
		run: (ctx) =>
			createLadder(
				ctx,
				ladderInput.parse({
					slug,
					name: 'Aldermoor 1650, a clock by hand',
					rig: 'n-12',
					profile: 'fixed-470',
					stresses: [
						{ workload: heavy, kind: 'heaviest', minutes: 30 },
						{ workload: everyday, kind: 'everyday', minutes: 20 }
					],
					purpose:
						'How far all sixteen cores go under the loop, and what voltage each step costs, before a clock goes into the guide.',
					stepMhz: 25,
					limitClockMhz: 5200,
					limitVolts: 1.3,
					limitTempC: 90,
					limitSource: 'voltage and temperature: the maker’s data sheet; clock: our own'
				})
			)
	},
	...rows.map((row, index) => recorded(world, row, index)),
	...voidedActs(world)
];
