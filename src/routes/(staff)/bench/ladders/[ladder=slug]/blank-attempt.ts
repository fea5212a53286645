import type { LadderReport } from '$lib/domain/bench/stability/ladder-report';
import type { AttemptFormTyped } from '$lib/schemas/ladder';

/** An attempt to fill in: what is proposed for the stress tried last, to be overwritten where it went otherwise. */
export function blankAttempt(
	{ stresses }: Pick<LadderReport, 'stresses'>,
	last: { stress: string } | undefined,
	key: string
): AttemptFormTyped {
	const at = stresses.find((one) => one.stress.slug === last?.stress) ?? stresses[0];
	const next = at?.next?.kind === 'try' ? at.next : null;
	const volts = next?.volts ?? at?.nextVolts ?? null;
	return {
		stress: at?.stress.slug ?? '',
		clockMHz: next ? String(next.clockMHz) : '',
		volts: volts === null ? '' : String(volts),
		durationMin: at ? String(at.stress.minutes) : '',
		outcome: 'passed',
		failure: '',
		errors: '0',
		peakTempC: '',
		packageW: '',
		ambientC: '',
		startedAt: null,
		started: '',
		notes: '',
		key
	};
}
