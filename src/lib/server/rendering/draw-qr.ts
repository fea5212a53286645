import QRCode from 'qrcode';
import { qrPath, quietModules } from '../../domain/stores/qr-path';

export interface DrawnQr {
	/** Side of the box that the path is drawn in, quiet zone included. */
	side: number;
	path: string;
}

/** A QR code of a text, with error correction M: it bears a scratched label. */
export function drawQr(text: string): DrawnQr {
	const { modules } = QRCode.create(text, { errorCorrectionLevel: 'M' });
	return { side: modules.size + 2 * quietModules, path: qrPath(modules.size, modules.data) };
}
