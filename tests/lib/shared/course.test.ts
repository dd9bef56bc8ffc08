import { expect, it } from 'vitest';
import { courseOfMaterial } from '@/lib/shared/course';
import { lastsHours } from '@/lib/shared/lasting';

const material = { id: 'A', profile: [8, 2], strength: 3, evaporationPerHour: 0.1 };

it('weakens at the rate of its evaporation, and keeps its proportions where no phase differs', () => {
  for (const { hours, profile } of courseOfMaterial(material)) {
    expect(profile[0]).toBeCloseTo(8 * Math.exp(-0.1 * hours), 3);
    expect(profile[0]).toBeCloseTo(4 * (profile[1] ?? 0), 9);
  }
});

it('ends when nothing is left to smell, and goes on for weeks where nothing evaporates', () => {
  expect(courseOfMaterial(material).at(-1)?.hours).toBe(48);
  expect(courseOfMaterial({ ...material, evaporationPerHour: 0 }).at(-1)?.hours).toBe(672);
  expect(courseOfMaterial({ ...material, evaporationPerHour: 50 })).toHaveLength(3);
});

it('passes from the opening over the heart to the dry phase', () => {
  const phases = { opening: [0, 10], heart: [5, 5], dry: [10, 0] };
  const course = courseOfMaterial({ ...material, phases, evaporationPerHour: 0 });
  const share = (hours: number) => course.find((point) => point.hours === hours)?.profile[0];
  expect(share(0.05)).toBe(0);
  expect(share(2)).toBe(5);
  expect(share(48)).toBe(10);
  const rising = course.map(({ profile }) => profile[0] ?? 0);
  expect(rising).toEqual(rising.toSorted((a, b) => a - b));
});

it('lasts until one part in fifty is left', () => {
  expect(lastsHours(null)).toBeNull();
  expect(Math.exp(-0.1 * (lastsHours(0.1) ?? 0))).toBeCloseTo(0.02, 3);
  expect(lastsHours(0)).toBe(10_000);
});
