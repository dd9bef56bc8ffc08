import { expect, it } from 'vitest';
import { isSameOrigin } from '@/lib/auth/origin';

const at = (headers: Record<string, string>) => isSameOrigin(new Headers({ host: 'stillroom.example', ...headers }));

it('takes a change from our own pages only', () => {
  expect(at({ 'sec-fetch-site': 'same-origin' })).toBe(true);
  expect(at({ origin: 'https://stillroom.example' })).toBe(true);
  for (const site of ['same-site', 'cross-site', 'none', '']) expect(at({ 'sec-fetch-site': site })).toBe(false);
  for (const origin of ['https://other.example', 'null', 'https://stillroom.example.other.example', ''])
    expect(at({ origin })).toBe(false);
  expect(at({})).toBe(false);
  expect(at({ origin: 'https://stillroom.example', 'sec-fetch-site': 'cross-site' })).toBe(false);
});
