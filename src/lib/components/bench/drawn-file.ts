export interface DrawnFile {
	blob: Blob;
	markup: string;
	width: number;
	height: number;
}

/** Dots to a px, so that a picture is sharp in print and on film. */
const density = 2;

/** A drawing of the page as a file of its own: the colours it has now written out, for there are no tokens outside. */
export function drawnFile(svg: SVGSVGElement): DrawnFile {
	const style = getComputedStyle(svg);
	const { width, height } = svg.viewBox.baseVal;
	const copy = document.importNode(svg, true);
	copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
	copy.setAttribute('width', String(width));
	copy.setAttribute('height', String(height));
	copy.setAttribute('font-family', style.fontFamily.replaceAll('"', "'"));
	const sheet = document.createElementNS('http://www.w3.org/2000/svg', 'rect');
	sheet.setAttribute('width', '100%');
	sheet.setAttribute('height', '100%');
	sheet.setAttribute('fill', 'var(--color-sheet)');
	copy.prepend(sheet);
	const whole = new XMLSerializer()
		.serializeToString(copy)
		.replace(
			/var\((--[a-z-]+)\)/g,
			(_, token: string) => style.getPropertyValue(token).trim() || 'currentColor'
		);
	return { blob: new Blob([whole], { type: 'image/svg+xml;charset=utf-8' }), markup: whole, width, height };
}

/** The same as PNG, drawn by the browser; null where it cannot. */
export async function pictureOf({ markup, width, height }: DrawnFile): Promise<Blob | null> {
	try {
		const image = new Image();
		// The page's policy lets pictures in from data addresses, not from blobs.
		image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(markup)}`;
		await image.decode();
		const canvas = document.createElement('canvas');
		canvas.width = width * density;
		canvas.height = height * density;
		canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
		return await new Promise((resolve) => canvas.toBlob(resolve, 'image/png'));
	} catch {
		return null;
	}
}
