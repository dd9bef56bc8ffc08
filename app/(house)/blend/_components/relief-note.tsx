import type { Relief } from '@/lib/shared/blend-relief';

/** What this rule costs, beside it: nothing where it costs nothing. */
export function ReliefNote({ reliefs }: { reliefs: readonly Relief[] }) {
  const [first] = reliefs;
  if (!first) return null;
  const isOfOneMaterial = first.kind === 'largest share' || first.kind === 'kept' || first.kind === 'limit';
  return (
    <p className="mt-1 border-l-2 border-ink pl-2">
      {isOfOneMaterial ? `${first.what.replace(/,$/, '')}: ${first.words}` : first.words}
    </p>
  );
}
