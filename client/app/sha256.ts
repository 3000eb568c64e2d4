/**
 * SHA-256 in hexadecimal. Null where the browser cannot hash: WebCrypto exists on secure origins only, not by plain http on a shop's network.
 */
export async function sha256(bytes: BufferSource): Promise<string | null> {
  // Missing there, whatever the types say.
  const { subtle } = globalThis.crypto as { subtle?: SubtleCrypto };
  if (!subtle) return null;
  const digest = new Uint8Array(await subtle.digest('SHA-256', bytes));
  return [...digest].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
