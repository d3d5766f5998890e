/** Shown only while the first page's code is on its way. */
export function LoadingPage() {
  return <p className="p-6 text-body text-ink-3">Opening …</p>;
}
