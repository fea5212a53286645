export interface DrawnFile {
	blob: Blob;
	width: number;
	height: number;
}

/** Dots to a px, so that a picture is sharp in print and on film. */
const density = 2;

/** A drawing of the page as a file of its own: the colours it has now written out, for there are no tokens outside. */
export function drawnFile(svg: SVGSVGElement): DrawnFile {
	const style = getComputedStyle(svg);
	const markup = new XMLSerializer()
		.serializeToString(svg)
		.replace(
			/var\((--[a-z-]+)\)/g,
			(_, token: string) => style.getPropertyValue(token).trim() || 'currentColor'
		);
	const { width, height } = svg.viewBox.baseVal;
	const sheet = style.getPropertyValue('--color-sheet').trim() || '#fff';
	const whole = markup.replace(
		/^<svg/,
		`<svg width="${width}" height="${height}" style="background:${sheet};font-family:${style.fontFamily.replace(/"/g, "'")}"`
	);
	return { blob: new Blob([whole], { type: 'image/svg+xml;charset=utf-8' }), width, height };
}

/** The same as PNG, drawn by the browser; null where it cannot. */
export async function pictureOf({ blob, width, height }: DrawnFile): Promise<Blob | null> {
	const address = URL.createObjectURL(blob);
	try {
		const image = new Image();
		image.src = address;
		await image.decode();
		const canvas = document.createElement('canvas');
		canvas.width = width * density;
		canvas.height = height * density;
		canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
		return await new Promise((resolve) => canvas.toBlob(resolve, 'image/png'));
	} catch {
		return null;
	} finally {
		URL.revokeObjectURL(address);
	}
}
