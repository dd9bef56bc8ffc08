import { spawnSync } from 'node:child_process';
import type { BlendProblem } from '@/engine/contract';

/** Reads [facets x materials matrix, target] and prints the least milliseconds of SciPy's nnls with a heavy row for sum 1. */
const SCRIPT = `
import json, sys, time
import numpy as np
from scipy.optimize import nnls
columns, target = json.load(sys.stdin)
best = 1e9
for _ in range(5):
    start = time.perf_counter()
    a = np.vstack([np.array(columns).T, 1e4 * np.ones(len(columns))])
    nnls(a, np.append(target, 1e4), maxiter=100 * len(columns))
    best = min(best, time.perf_counter() - start)
print(1e3 * best)
`;

/** Milliseconds that SciPy's nnls takes for a problem without rules on the mass; null where SciPy is not installed. */
export function scipyTime({ candidates, target }: BlendProblem): number | null {
  const input = JSON.stringify([candidates.map(({ profile }) => Array.from(profile)), Array.from(target)]);
  const { status, stdout } = spawnSync('python3', ['-c', SCRIPT], { input, encoding: 'utf8', maxBuffer: 1e9 });
  return status === 0 ? Number(stdout) : null;
}
