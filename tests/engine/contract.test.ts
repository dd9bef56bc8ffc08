import { expect, it } from 'vitest';
import { EngineInputError } from '@/engine/errors';

it('names the field of a fault', () => {
  expect(new EngineInputError('target', 'The target is empty.').path).toBe('target');
});
