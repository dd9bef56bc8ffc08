import type { EngineMaterial } from '@/engine/contract';
import type { Relation } from '@/engine/map/related-materials';

/** The map's links by comparing every material with every other, straight from the definition. */
export function allPairs(
  materials: readonly EngineMaterial[],
  { top, minSimilarity, by }: { top: number; minSimilarity: number; by: 'facets' | 'constituents' },
): Relation[] {
  const sorted = [...materials].sort((a, b) => (a.id < b.id ? -1 : 1));
  const vectors = by === 'facets' ? sorted.map((material) => unit(material.profile)) : constituentVectors(sorted);
  const found = new Map<string, Relation>();
  for (const [row, vector] of vectors.entries()) {
    const others: { row: number; similarity: number }[] = [];
    for (const [other, otherVector] of vectors.entries()) {
      if (other === row) continue;
      const similarity = dot(vector, otherVector);
      if (similarity > 0 && similarity >= minSimilarity) others.push({ row: other, similarity });
    }
    others.sort((a, b) => b.similarity - a.similarity || a.row - b.row);
    for (const { row: other, similarity } of others.slice(0, top)) {
      const [a, b] = [sorted[Math.min(row, other)]!.id, sorted[Math.max(row, other)]!.id];
      found.set(`${a}\n${b}`, { a, b, similarity: Math.min(1, similarity) });
    }
  }
  const text = (one: string, other: string) => (one < other ? -1 : Number(one > other));
  return [...found.values()].sort((x, y) => y.similarity - x.similarity || text(x.a, y.a) || text(x.b, y.b));
}

function constituentVectors(materials: readonly EngineMaterial[]): Float64Array[] {
  const names = [...new Set(materials.flatMap((it) => (it.constituents ?? []).map((one) => one.id)))].sort();
  return materials.map((material) =>
    unit(
      names.map((name) => {
        const held = material.constituents?.find((one) => one.id === name);
        return held ? (held.typical ?? held.max) : 0;
      }),
    ),
  );
}

function unit(vector: ArrayLike<number>): Float64Array {
  let largest = 0;
  let sum = 0;
  for (let i = 0; i < vector.length; i++) largest = Math.max(largest, Math.abs(vector[i]!));
  for (let i = 0; i < vector.length; i++) sum += largest > 0 ? (vector[i]! / largest) ** 2 : 0;
  return Float64Array.from(vector, (value) => (largest > 0 ? value / largest / Math.sqrt(sum) : 0));
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
