/** The nonce that our content security policy gives the style elements of this page; undefined in development. */
export function styleNonce(): string | undefined {
  return document.querySelector<HTMLMetaElement>('meta[name="style-nonce"]')?.content || undefined;
}
