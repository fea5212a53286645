/** A mark's own shape, drawn in an 11 × 11 box; strokes take the colour of the text. */
export interface Shape {
	path: string;
	/** Width of the pen; 0 for a filled shape. */
	stroke: number;
}

export const shapes = {
	slash: { path: 'M1 10L9 2', stroke: 2 },
	square: { path: 'M1.5 1.5h8v8h-8z', stroke: 2 },
	cross: { path: 'M1 10L10 1M1 1l9 9', stroke: 2 },
	tick: { path: 'M1 6l3 4 6-9', stroke: 2 },
	clock: { path: 'M5.5 1a4.5 4.5 0 1 1 0 9a4.5 4.5 0 1 1 0-9zM5.5 3v3h2.4', stroke: 1.6 },
	dot: { path: 'M5.5 .5a5 5 0 1 1 0 10a5 5 0 1 1 0-10z', stroke: 0 },
	ring: { path: 'M5.5 1.5a4 4 0 1 1 0 8a4 4 0 1 1 0-8z', stroke: 2 },
	bar: { path: 'M0 5.5h11', stroke: 2.4 },
	pennant: { path: 'M1.5 11V1h8L7 4l2.5 3h-7', stroke: 1.8 },
	gate: { path: 'M1 1.5h9M1 9.5h9M5.5 1.5v8', stroke: 2 },
	rails: { path: 'M3 .5v10M8 .5v10', stroke: 2.2 },
	triangle: { path: 'M5.5 .5l5.3 9.5H.2z', stroke: 0 },
	chevron: { path: 'M3 1l5 4.5L3 10', stroke: 2 }
} as const satisfies Record<string, Shape>;

export type ShapeName = keyof typeof shapes;
export type Ink = 'ink' | 'graphite' | 'blue' | 'red' | 'brass' | 'verdigris' | 'plum';

/** What a mark can say: each kind has its own shape as well as its ink, so that none is told by colour alone. */
export const kinds = {
	passed: { shape: 'tick', ink: 'verdigris' },
	signed: { shape: 'tick', ink: 'verdigris' },
	done: { shape: 'tick', ink: 'verdigris' },
	flagged: { shape: 'pennant', ink: 'red' },
	error: { shape: 'cross', ink: 'red' },
	failed: { shape: 'cross', ink: 'red' },
	caution: { shape: 'triangle', ink: 'red' },
	waiting: { shape: 'clock', ink: 'brass' },
	loan: { shape: 'rails', ink: 'brass' },
	embargo: { shape: 'gate', ink: 'brass' },
	info: { shape: 'square', ink: 'blue' },
	advice: { shape: 'chevron', ink: 'blue' },
	open: { shape: 'ring', ink: 'graphite' },
	draft: { shape: 'slash', ink: 'graphite' },
	void: { shape: 'bar', ink: 'graphite' },
	live: { shape: 'dot', ink: 'ink' }
} as const satisfies Record<string, { shape: ShapeName; ink: Ink }>;

export type MarkKind = keyof typeof kinds;

/** Tailwind finds class names by reading the source, so each is written out. */
export const inkClass: Record<Ink, string> = {
	ink: 'text-ink',
	graphite: 'text-graphite',
	blue: 'text-blue',
	red: 'text-red',
	brass: 'text-brass',
	verdigris: 'text-verdigris',
	plum: 'text-plum'
};
