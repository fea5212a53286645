import { describe, expect, it } from 'vitest';
import { fortnight, fortnightSpan } from './fortnight';
import { dayWords, greeting, inDateOrder, toChange, toReview, toSchedule, toSign } from './waiting';

const zone = 'Europe/Oslo';
// Wednesday 11 November 2026, 08:40 in Oslo (CET, UTC+1).
const now = new Date('2026-11-11T07:40:00Z');
const card = {
	slug: 'brisk-360',
	title: 'Brisk 360: quiet at what price',
	stage: 'in-review',
	slotAt: new Date('2026-11-12T08:00:00Z'),
	updatedAt: new Date('2026-11-09T10:00:00Z'),
	authorName: 'Jonas Vell'
};

describe('what waits', () => {
	it('is said in words, with the act that answers it', () => {
		expect(toReview(card, 2, now)).toMatchObject({
			detail: 'Jonas Vell submitted it for review; 2 blocking comments stand.',
			action: { label: 'Review', href: '/desk/articles/brisk-360/review' }
		});
		expect(toChange({ ...card, stage: 'changes-asked' }, 1, now).detail).toBe(
			'Changes asked; 1 comment to answer.'
		);
		const embargo = { until: new Date('2026-11-13T13:00:00Z'), partName: 'Marlow G70' };
		expect(toSchedule({ ...card, slotAt: null }, embargo, now, zone).detail).toBe(
			'Approved, without a slot. The embargo on Marlow G70 lifts Fri 13 Nov, 14:00.'
		);
		const campaign = { slug: 'first-look', name: 'First look', dueAt: null, cells: 1, latest: now };
		expect(toSign(campaign, now).detail).toBe('1 cell has all readings and no signature.');
	});

	it('stands in date order, and is late only past a date of its own', () => {
		const early = toReview({ ...card, slotAt: new Date('2026-11-10T08:00:00Z') }, 0, now);
		const unslotted = toReview({ ...card, slotAt: null }, 0, now);
		expect(early.late).toBe(true);
		expect(unslotted.late).toBe(false);
		expect(inDateOrder([toReview(card, 0, now), early, unslotted]).map((one) => one.at)).toEqual([
			unslotted.at,
			early.at,
			card.slotAt
		]);
	});

	it('names days as somebody at a desk does, in the publication’s zone', () => {
		expect(dayWords(new Date('2026-11-11T11:00:00Z'), now, zone)).toBe('today 12:00');
		// 23:30 UTC on the tenth is half past midnight today in Oslo.
		expect(dayWords(new Date('2026-11-10T23:30:00Z'), now, zone)).toBe('today 00:30');
		expect(dayWords(new Date('2026-11-10T12:00:00Z'), now, zone)).toBe('yesterday');
		expect(dayWords(new Date('2026-11-13T13:00:00Z'), now, zone)).toBe('Friday 14:00');
		expect(dayWords(new Date('2026-12-01T13:00:00Z'), now, zone)).toBe('1 Dec');
		expect(greeting(now, zone)).toBe('Good morning');
	});
});

describe('the fortnight', () => {
	it('runs from Monday over two weeks, across a change of clocks', () => {
		const span = fortnightSpan(new Date('2026-10-21T10:00:00Z'), zone);
		expect(span.firstDay).toBe('2026-10-19');
		// Monday 00:00 CEST is 22:00 UTC the day before; two weeks on, CET: 23:00 UTC.
		expect(span.from.toISOString()).toBe('2026-10-18T22:00:00.000Z');
		expect(span.to.toISOString()).toBe('2026-11-01T23:00:00.000Z');
	});

	it('puts each event on its local day', () => {
		const days = fortnight(now, zone, [
			{ kind: 'scheduled', at: new Date('2026-11-12T15:00:00Z'), title: 'b', href: null },
			{ kind: 'scheduled', at: new Date('2026-11-12T08:00:00Z'), title: 'a', href: null },
			{ kind: 'loan', at: null, day: '2026-11-20', title: 'c', href: null }
		]);
		expect(days).toHaveLength(14);
		expect(days[0]?.label).toBe('Mon 9');
		expect(days[2]?.isToday).toBe(true);
		expect(days[3]?.events.map((event) => [event.time, event.title])).toEqual([
			['09:00', 'a'],
			['16:00', 'b']
		]);
		expect(days[11]?.events[0]?.title).toBe('c');
	});
});
