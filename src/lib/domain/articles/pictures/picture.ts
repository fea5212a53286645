/** Widths a stored picture can be had in; the last is the largest kept. */
export const pictureWidths = [640, 1280, 2560] as const;
/** The longest side of a picture that is kept. */
export const longestSidePx = 2560;
/** The largest file that is taken. */
export const pictureLimitBytes = 25_000_000;
/** The most pixels that are decoded: past any camera's picture, far below what would fill the memory. */
export const pictureLimitPixels = 100_000_000;
/** The longest text alternative that is kept. */
export const altMaxLength = 500;

/** What a page must know of a picture to set it without moving when it arrives. */
export interface PictureFacts {
	/** Of the file kept, in hex; it is the picture's address. */
	sha256: string;
	width: number;
	height: number;
	/** What stands in for WebP where that is not shown. */
	fallback: 'jpg' | 'png';
}

/** Where a picture stands. @example pictureAddress('ab12…') === '/pictures/ab12….webp' */
export const pictureAddress = (sha256: string, file: 'webp' | 'jpg' | 'png' = 'webp'): string =>
	`/pictures/${sha256}.${file}`;

const address = /^\/pictures\/([0-9a-f]{64})\.(?:webp|jpg|png)$/;

/** The hash of the stored picture that an address leads to; null where it leads elsewhere. */
export const pictureAt = (href: string): string | null => address.exec(href)?.[1] ?? null;

/** The hashes of the stored pictures that a text names anywhere, each once, in the order they first appear. */
export const picturesIn = (text: string): string[] => [
	...new Set([...text.matchAll(/\/pictures\/([0-9a-f]{64})(?![0-9a-f])/g)].map((match) => match[1] ?? ''))
];

/** The widths a picture of a width is kept in besides its own, the narrowest first. */
export const narrowerWidths = (width: number): number[] => pictureWidths.filter((one) => one < width);

/**
 * The width of the kept file that serves a wanted one: the narrowest that is wide enough, else the picture's own.
 * @example servedWidth(1800, 640) === 640; servedWidth(500, 640) === 500
 */
export const servedWidth = (width: number, wanted: number | null): number =>
	wanted === null ? width : (narrowerWidths(width).find((one) => one >= wanted) ?? width);
