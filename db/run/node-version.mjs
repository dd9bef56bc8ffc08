import { CannotGoOn } from './sentence.mjs';

/** Next asks for this one. */
const OLDEST = [20, 9];

export function checkNode(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number);
  if (major > OLDEST[0] || (major === OLDEST[0] && minor >= OLDEST[1])) return;
  throw new CannotGoOn(`Stillroom needs Node ${OLDEST.join('.')} or newer; this is ${version}.`);
}
