import { expect, it } from 'vitest';
import { may, PERMISSIONS, ROLES } from '@/lib/shared/permissions';

it('lets an owner do everything and a member with no role nothing', () => {
  for (const permission of PERMISSIONS) {
    expect(may(['owner'], permission)).toBe(true);
    expect(may([], permission)).toBe(false);
  }
});

it('keeps prices and proportions from those who may not know them', () => {
  for (const role of ['evaluator', 'safety', 'student'] as const) expect(may([role], 'price.read')).toBe(false);
  for (const role of ['evaluator', 'buyer', 'student'] as const) expect(may([role], 'blend.read')).toBe(false);
  expect(may(['student'], 'supplier.read')).toBe(false);
});

it('gives the union of several roles', () => {
  for (const permission of PERMISSIONS)
    for (const a of ROLES)
      for (const b of ROLES) expect(may([a, b], permission)).toBe(may([a], permission) || may([b], permission));
});
