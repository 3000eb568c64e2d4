/**
 * SHA-256 of a file's bytes in hexadecimal.
 * @throws Error where the browser cannot hash: by plain http on a network, WebCrypto is missing
 */
export async function checksumOfFile(file: Blob): Promise<string> {
  // Missing where the page came by plain http from another machine, whatever the types say.
  const { subtle } = globalThis.crypto as { subtle?: SubtleCrypto };
  if (!subtle)
    throw new Error('This browser cannot check files over plain http. Type the printed code instead.');
  const digest = new Uint8Array(await subtle.digest('SHA-256', await file.arrayBuffer()));
  return [...digest].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
