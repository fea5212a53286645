/** The one password of the demo's people. It is printed on the demo's sign-in page and opens nothing else. */
export const demoPassword = 'measure-then-print';

/** The demo's people, all invented: one for each role. */
export const demoPeople = [
	{ role: 'tester', name: 'Tomas Reyl', email: 'tester@northlight.example' },
	{ role: 'writer', name: 'Ines Calloway', email: 'writer@northlight.example' },
	{ role: 'editor', name: 'Marit Solberg', email: 'editor@northlight.example' },
	{ role: 'liaison', name: 'Jonas Vedeler', email: 'liaison@northlight.example' },
	{ role: 'admin', name: 'Adaeze Okoro', email: 'admin@northlight.example' }
] as const;
