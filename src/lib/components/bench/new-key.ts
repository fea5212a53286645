/** A key that no other browser makes: 128 random bits in hex. Unlike randomUUID it works without TLS too. */
export const newKey = (): string =>
	Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, '0')).join(
		''
	);
