/**
 * A new UUID (version 4, RFC 9562) for a row that is made here. Browsers offer `crypto.randomUUID` only on
 * https and on this machine itself; in a hall the server is often a laptop on plain http, so the bytes are
 * put together by hand there.
 */
export function newId(
  source: Pick<Crypto, 'getRandomValues'> & Partial<Pick<Crypto, 'randomUUID'>> = crypto,
): string {
  if (typeof source.randomUUID === 'function') return source.randomUUID()
  const bytes = source.getRandomValues(new Uint8Array(16))
  const version = ((bytes[6] ?? 0) & 0x0f) | 0x40
  const variant = ((bytes[8] ?? 0) & 0x3f) | 0x80
  const hex = [...bytes]
    .map((byte, index) =>
      (index === 6 ? version : index === 8 ? variant : byte).toString(16).padStart(2, '0'),
    )
    .join('')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}
