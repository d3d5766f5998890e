/** The mark: copper thread over ink weft, with a gap that shows which lies on top. */
export function Mark({ className = 'size-7' }: { className?: string }) {
  return (
    <svg viewBox="0 0 32 32" className={className} fill="none" aria-hidden="true">
      <path d="M5 6.5v7M5 18.5v7M27.5 6.5v7M27.5 18.5v7" stroke="#7b8794" strokeWidth="2" />
      <path
        d="M1 16h8.1M14.9 16h1l1.7 9.5 4.3-18 2 8.5H31"
        stroke="#1f2a37"
        strokeWidth="2.6"
        strokeLinejoin="round"
      />
      <path d="M12 2v28" stroke="#b4532a" strokeWidth="2.8" />
    </svg>
  );
}

export function Wordmark() {
  return (
    <span className="flex items-center gap-2.5">
      <Mark />
      <span className="text-lead font-semibold tracking-[-0.018em] text-ink max-[30rem]:sr-only">
        Paceloom
      </span>
    </span>
  );
}
