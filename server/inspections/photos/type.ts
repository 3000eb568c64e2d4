/** The types of photographs that are taken. */
export type PhotoType = 'jpeg' | 'png' | 'webp';

const JPEG = [0xff, 0xd8, 0xff];
const PNG = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a];
const RIFF = [0x52, 0x49, 0x46, 0x46];
const WEBP = [0x57, 0x45, 0x42, 0x50];
const WEBP_AT = 8;

function holds(bytes: Uint8Array, signature: readonly number[], at = 0): boolean {
  return signature.every((byte, i) => bytes[at + i] === byte);
}

/** What a file is by its first bytes (ISO/IEC 10918-1, ISO/IEC 15948, RFC 9649); null for anything else, whatever it is called. */
export function photoTypeOf(bytes: Uint8Array): PhotoType | null {
  if (holds(bytes, JPEG)) return 'jpeg';
  if (holds(bytes, PNG)) return 'png';
  if (holds(bytes, RIFF) && holds(bytes, WEBP, WEBP_AT)) return 'webp';
  return null;
}
