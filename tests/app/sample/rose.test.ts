import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { roseSample } from '../../support/rose-sample';

const FILE = path.resolve(import.meta.dirname, '../../../app/_sample/rose.json');

describe('the sample that the public page carries', () => {
  // When the library changes, `npx vitest run -u` with this file writes the sample anew.
  it('is part of the sample library, to the last figure and colour', async () => {
    await expect(`${JSON.stringify(roseSample())}\n`).toMatchFileSnapshot(FILE);
  });
});
