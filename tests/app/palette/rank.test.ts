import { describe, expect, it } from 'vitest';
import { type FoundGroup, rankHits } from '@/app/_components/palette/rank';

const group = (id: string, labels: string[], searched = false): FoundGroup => ({
  ...{ id, label: id, searched },
  items: labels.map((label) => ({ id: label, label, href: `/${label}` })),
});
const labels = (query: string, groups: FoundGroup[]) => rankHits(query, groups).map(({ label }) => label);

describe('the palette', () => {
  const screens = group('Screens', ['Materials', 'Map', 'Blend']);
  const actions = group('Actions', ['Solve a new blend', 'Dark theme']);

  it('shows every group in its order before anything is typed', () => {
    expect(labels('', [screens, actions])).toEqual(['Materials', 'Map', 'Blend', 'Solve a new blend', 'Dark theme']);
  });

  it('puts the group first that holds the best hit', () => {
    expect(labels('map', [actions, screens])[0]).toBe('Map');
    expect(labels('dark', [screens, actions])[0]).toBe('Dark theme');
  });

  it('leaves out scattered letters where a name holds the whole word', () => {
    const materials = group('Materials', ['Rose oil', 'Rosewood oil'], true);
    const noise = group('Actions', ['Remember old songs every day']);
    expect(labels('rose', [noise])).toEqual(['Remember old songs every day']);
    expect(labels('rose', [noise, materials])).toEqual(['Rose oil', 'Rosewood oil']);
  });

  it('keeps what the server found by a name that isn’t shown', () => {
    const found = group('Materials', ['Linalool'], true);
    expect(labels('78-70-6', [screens, found])).toEqual(['Linalool']);
  });

  it('names the group of each hit, and shows at most twelve of one', () => {
    const many = group(
      'Materials',
      Array.from({ length: 20 }, (_, at) => `Rose ${at}`),
    );
    const hits = rankHits('rose', [many]);
    expect(hits).toHaveLength(12);
    expect(hits.every(({ group }) => group === 'Materials')).toBe(true);
  });
});
