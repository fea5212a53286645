/** Where the files of a picture are in the store: the whole one, narrower ones by their width, and what stands in for WebP. */
export const pictureKey = (sha256: string, part: 'whole' | 'fallback' | number): string =>
	`pictures/${sha256.slice(0, 2)}/${sha256}/${part}`;
