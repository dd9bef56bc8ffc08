/** The mark: a smelling strip, dipped. In ink, because colour belongs to smell. */
export function Mark({ height = 22 }: { height?: number }) {
  return (
    <svg viewBox="0 0 12 32" height={height} width={(height * 12) / 32} aria-hidden="true" className="flex-none">
      <path d="M.75 6a5.25 5.25 0 0 1 10.5 0v25.25H.75Z" fill="var(--paper)" stroke="var(--ink)" strokeWidth="1.5" />
      <path d="M.75 6a5.25 5.25 0 0 1 10.5 0v12.5c-1.75 1.5-3.5-1.5-5.25 0s-3.5 1.5-5.25 0Z" fill="var(--ink)" />
    </svg>
  );
}

export function Wordmark({ height = 22 }: { height?: number }) {
  return (
    <span className="inline-flex items-center gap-2.5">
      <Mark height={height} />
      <span
        className="font-[600] tracking-[-0.02em] [font-stretch:86%]"
        style={{ fontSize: height * 0.86, lineHeight: 1 }}
      >
        Stillroom
      </span>
    </span>
  );
}
