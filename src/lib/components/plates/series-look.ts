/** How one series looks: its ink, and the mark that tells it apart in a grey print. */
export interface SeriesLook {
	/** A colour token, so that light and dark both work. */
	ink: string;
	/** Path of its mark around a point. */
	mark: (x: number, y: number) => string;
	/** Drawn as an outline: the second round of marks. */
	hollow: boolean;
	/** Dash of its whiskers; none for a full line. */
	dash: string | undefined;
}

const n = (value: number): string => String(Math.round(value * 10) / 10);

const circle = (x: number, y: number): string =>
	`M${n(x - 4.8)} ${n(y)}a4.8 4.8 0 1 0 9.6 0a4.8 4.8 0 1 0 -9.6 0z`;
const triangle = (x: number, y: number): string => `M${n(x)} ${n(y - 6)}l6 10.5h-12z`;
const square = (x: number, y: number): string => `M${n(x - 4.5)} ${n(y - 4.5)}h9v9h-9z`;
const diamond = (x: number, y: number): string => `M${n(x)} ${n(y - 6.2)}l6.2 6.2l-6.2 6.2l-6.2 -6.2z`;
const cross = (x: number, y: number): string =>
	`M${n(x - 5)} ${n(y - 3)}l2 -2l3 3l3 -3l2 2l-3 3l3 3l-2 2l-3 -3l-3 3l-2 -2l3 -3z`;

const rounds = [
	{ ink: 'var(--color-blue)', mark: circle },
	{ ink: 'var(--color-verdigris)', mark: triangle },
	{ ink: 'var(--color-brass)', mark: square },
	{ ink: 'var(--color-plum)', mark: diamond }
];

/** The look of a series by its number: 0 is stock, in graphite; 1 the subject, in blue; then the further ones. */
export function seriesLook(series: number): SeriesLook {
	const first = rounds[(series - 1) % rounds.length];
	if (series <= 0 || !first) {
		return { ink: 'var(--color-graphite)', mark: cross, hollow: false, dash: undefined };
	}
	const round = Math.floor((series - 1) / rounds.length);
	return { ...first, hollow: round % 2 === 1, dash: round > 0 ? '3 2' : undefined };
}
