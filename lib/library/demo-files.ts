import 'server-only';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import type { z } from 'zod';
import {
  allergenFile,
  categoryFile,
  constituentFile,
  facetFile,
  limitSetFile,
  materialFile,
  peopleFile,
  qualityFile,
  supplierFile,
} from './demo-format';

/** The whole sample library, parsed. Throws, naming the file and the field, when a file is not as `demo-format.ts` says. */
export function readDemoLibrary(folder = path.join(process.cwd(), 'db', 'demo')) {
  const one = <T>(name: string, schema: z.ZodType<T>) => readOne(path.join(folder, name), schema);
  const all = <T>(name: string, schema: z.ZodType<T>, not: string[] = []) =>
    readdirSync(path.join(folder, name))
      .filter((file) => file.endsWith('.json') && !not.includes(file))
      .sort()
      .map((file) => one(path.join(name, file), schema));
  const materialFiles = all('materials', materialFile);
  const qualityFiles = all('qualities', qualityFile);
  return {
    ...one('facets.json', facetFile),
    materialFiles,
    materials: materialFiles.flatMap((file) => file.materials),
    constituents: one('constituents.json', constituentFile).constituents,
    suppliers: one('suppliers.json', supplierFile).suppliers,
    qualities: qualityFiles.flatMap((file) => file.qualities),
    categories: one(path.join('limits', 'categories.json'), categoryFile).categories,
    limitSets: all('limits', limitSetFile, ['categories.json']),
    allergens: one('allergens.json', allergenFile),
    people: one('people.json', peopleFile),
  };
}

export type DemoLibrary = ReturnType<typeof readDemoLibrary>;

function readOne<T>(file: string, schema: z.ZodType<T>): T {
  const parsed = schema.safeParse(JSON.parse(readFileSync(file, 'utf8')));
  if (parsed.success) return parsed.data;
  const issue = parsed.error.issues[0];
  throw new Error(`${file}: ${issue?.path.join('.')}: ${issue?.message}`, { cause: parsed.error });
}
