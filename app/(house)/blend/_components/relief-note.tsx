import type { Relief } from '@/lib/shared/blend-relief';

/** What this rule costs, beside it: nothing where it costs nothing. */
export function ReliefNote({ reliefs }: { reliefs: readonly Relief[] }) {
  const [first] = reliefs;
  return first ? <p className="mt-1 border-l-2 border-ink pl-2">{first.words}</p> : null;
}
