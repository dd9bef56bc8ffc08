interface SentencesProps {
  heldBack: readonly string[];
  proof: string;
  cautions: readonly string[];
}

/** What the answer says in words: what holds it back, what to mind, and how it is known. */
export function Sentences({ heldBack, proof, cautions }: SentencesProps) {
  return (
    <div className="grid max-w-[62ch] gap-2">
      {heldBack.map((sentence, index) => (
        <p key={sentence} className={index === 0 ? 'text-body' : 'text-ink-soft'}>
          {sentence}
        </p>
      ))}
      {cautions.map((sentence) => (
        <p key={sentence} className="flex gap-2 font-[560]">
          <span
            aria-hidden="true"
            className="mt-px grid size-4 flex-none place-items-center rounded-strip bg-ink text-note text-on-ink"
          >
            !
          </span>
          {sentence}
        </p>
      ))}
      <p className="text-ink-soft">{proof}</p>
      <p className="text-ink-soft">Closest in this model; smell it next.</p>
    </div>
  );
}
