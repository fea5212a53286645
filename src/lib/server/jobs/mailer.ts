import { createTransport } from 'nodemailer';
import type { JobTools } from './handler';

/** Delivery through an SMTP server, over connections that are kept. */
export function openMailer(
	smtpUrl: string,
	from: string
): JobTools & { verify: () => Promise<boolean>; close: () => void } {
	const address = new URL(smtpUrl);
	const secure = address.protocol === 'smtps:';
	const transport = createTransport({
		pool: true,
		host: address.hostname,
		port: Number(address.port) || (secure ? 465 : 587),
		secure,
		auth: address.username
			? { user: decodeURIComponent(address.username), pass: decodeURIComponent(address.password) }
			: undefined,
		connectionTimeout: 10_000,
		greetingTimeout: 10_000,
		socketTimeout: 30_000
	});
	return {
		deliver: async ({ messageId, recipient, subject, textBody, htmlBody }) => {
			await transport.sendMail({
				from,
				// An object, so that nothing in an address is read as a list of addresses.
				to: { name: '', address: recipient },
				subject,
				text: textBody,
				html: htmlBody,
				messageId: `<${messageId}>`,
				headers: { 'Auto-Submitted': 'auto-generated' }
			});
		},
		verify: () => transport.verify().catch(() => false),
		close: () => transport.close()
	};
}
