// What a lab has before it measures: people, parts, samples, rigs, profiles, workloads, and partners with their loans.
import { randomUUID } from 'node:crypto';
import { insertRows, nextId, upTo } from './insert.mjs';

const makers = ['Aldermoor', 'Hollin', 'Pennon', 'Brisk', 'Marlow', 'Tarrow', 'Ostin', 'Velder'];
const kinds = ['processor', 'board', 'memory', 'cooler', 'graphics'];
const classes = ['light-threaded', 'all-core', 'game', 'memory', 'stress'];
const roles = ['tester', 'writer', 'editor', 'liaison', 'admin'];
const profilesOfRig = 5;

/** @param {unknown[]} list @param {number} i */
const turn = (list, i) => list[i % list.length];

/**
 * @param {import('mysql2/promise').Connection} connection
 * @param {{ size: number, tag: string, now: Date }} options how many of what grows with the campaigns; a word that keeps names apart
 */
export async function fillLab(connection, { size, tag, now }) {
	const created_at = now;
	const people = upTo(Math.max(5, Math.round(size / 5))).map((i) => ({
		id: randomUUID(),
		name: `${turn(['Ines', 'Tomas', 'Marit', 'Jonas', 'Adaeze'], i)} ${tag} ${i}`,
		email: `person-${i}@${tag}.example`,
		created_at
	}));
	await insertRows(connection, 'user', people);
	await insertRows(
		connection,
		'user_role',
		people.map(({ id }, i) => ({ user_id: id, role: turn(roles, i) }))
	);
	const person = /** @param {number} i */ (i) => people[i % people.length]?.id ?? '';

	const part = await nextId(connection, 'part');
	await insertRows(
		connection,
		'part',
		upTo(size).map((i) => ({
			id: part + i,
			slug: `${tag}-part-${i}`,
			kind: turn(kinds, i),
			maker: turn(makers, i),
			model: `Model ${i}`,
			specification: JSON.stringify([{ name: 'Cores', value: '16' }]),
			created_at
		}))
	);
	await insertRows(
		connection,
		'part_price',
		upTo(size * 3).map((i) => ({
			part_id: part + (i % size),
			amount_minor: 10_000 + i,
			currency: 'EUR',
			observed_on: `2026-0${1 + Math.floor(i / size)}-15`,
			created_at
		}))
	);
	const sample = await nextId(connection, 'sample');
	await insertRows(
		connection,
		'sample',
		upTo(size * 2).map((i) => ({
			id: sample + i,
			slug: `${tag}-sample-${i}`,
			part_id: part + (i % size),
			serial: `${tag}-${i}`,
			provenance: turn(['bought', 'loaned', 'given', 'pre-production'], i),
			created_at
		}))
	);
	await fillLoans(connection, { size, tag, now, sample, person: person(3) });

	const rigs = Math.max(2, Math.round(size / 5));
	const rig = await nextId(connection, 'rig');
	const revision = await nextId(connection, 'rig_revision');
	await insertRows(
		connection,
		'rig',
		upTo(rigs).map((i) => ({ id: rig + i, slug: `${tag}-rig-${i}`, name: `Rig ${tag} ${i}`, created_at }))
	);
	await insertRows(
		connection,
		'rig_revision',
		upTo(rigs).map((i) => ({
			id: revision + i,
			rig_id: rig + i,
			number: 1,
			firmware: '2.14',
			change: '',
			created_by: person(0),
			created_at
		}))
	);
	await insertRows(
		connection,
		'rig_sample',
		upTo(rigs * 4).map((i) => ({
			rig_revision_id: revision + (i % rigs),
			sample_id: sample + i,
			position: 1 + Math.floor(i / rigs)
		}))
	);
	const profile = await nextId(connection, 'profile');
	const profiles = upTo(rigs * profilesOfRig).map((i) => ({
		id: profile + i,
		rig_id: rig + Math.floor(i / profilesOfRig),
		slug: i % profilesOfRig === 0 ? 'stock' : `step-${i % profilesOfRig}`,
		name: i % profilesOfRig === 0 ? 'Stock' : `Step ${i % profilesOfRig}`,
		parent_id: i % profilesOfRig === 0 ? null : profile + i - (i % profilesOfRig),
		notes: '',
		created_at
	}));
	await insertRows(connection, 'profile', profiles);
	await insertRows(
		connection,
		'profile_setting',
		profiles.flatMap(({ id, parent_id }) =>
			parent_id === null
				? []
				: upTo(6).map((position) => ({
						profile_id: id,
						position,
						menu_path: 'Tuning > Processor',
						setting: `Setting ${position}`,
						value: String(40 + position),
						quantity: 'other'
					}))
		)
	);
	const workloads = Math.max(12, Math.round(size / 4));
	const workload = await nextId(connection, 'workload');
	await insertRows(
		connection,
		'workload',
		upTo(workloads).map((i) => ({
			id: workload + i,
			slug: `${tag}-workload-${i}`,
			name: `Workload ${tag} ${i}`,
			settings: 'preset two',
			quantity: 'time',
			unit: 's',
			better: turn(['lower', 'higher'], i),
			class: turn(classes, i),
			repeats: 10,
			least_difference_percent: 1,
			created_at
		}))
	);
	return { part, sample, rigs, revision, profile, profilesOfRig, workload, workloads, person, people };
}

/**
 * @param {import('mysql2/promise').Connection} connection
 * @param {{ size: number, tag: string, now: Date, sample: number, person: string }} options
 */
async function fillLoans(connection, { size, tag, now, sample, person }) {
	const partners = Math.max(2, Math.round(size / 5));
	const partner = await nextId(connection, 'partner');
	await insertRows(
		connection,
		'partner',
		upTo(partners).map((i) => ({
			id: partner + i,
			slug: `${tag}-partner-${i}`,
			name: `Partner ${tag} ${i}`,
			notes: '',
			created_at: now
		}))
	);
	const loan = await nextId(connection, 'loan');
	await insertRows(
		connection,
		'loan',
		upTo(size).map((i) => ({
			id: loan + i,
			partner_id: partner + (i % partners),
			stage: turn(['here', 'returned', 'in-transit', 'promised'], i),
			asked_on: '2026-01-10',
			received_on: '2026-02-01',
			due_on: `2027-${String(1 + (i % 12)).padStart(2, '0')}-15`,
			terms: 'Back in its box.',
			disclosure: 'Lent by its maker.',
			created_by: person,
			created_at: now
		}))
	);
	await insertRows(
		connection,
		'loan_sample',
		upTo(size).map((i) => ({ loan_id: loan + i, sample_id: sample + i }))
	);
}
