import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { RouteHandler } from '@/lib/api/team-route';

export const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;
export type Method = (typeof METHODS)[number];

export interface Route {
  method: Method;
  /** As in `/api/v1/materials/[id]`. */
  path: string;
  handler: RouteHandler;
}

const ROOT = path.resolve(import.meta.dirname, '..', '..');

/** Every route file of the app, whatever it answers. */
export function routeFiles(): string[] {
  const app = path.join(ROOT, 'app');
  const files = readdirSync(app, { recursive: true, encoding: 'utf8' });
  return files
    .filter((file) => path.basename(file) === 'route.ts' || path.basename(file) === 'route.tsx')
    .map((file) => path.join(app, file))
    .sort();
}

/** Every method of every route under /api/v1, found on the disk and imported. */
export async function apiRoutes(): Promise<Route[]> {
  const found: Route[] = [];
  for (const file of routeFiles().filter((each) => each.startsWith(path.join(ROOT, 'app', 'api', 'v1') + path.sep))) {
    const module = (await import(/* @vite-ignore */ pathToFileURL(file).href)) as Record<string, RouteHandler>;
    for (const method of METHODS) {
      const handler = module[method];
      if (handler) found.push({ method, path: pathOf(file), handler });
    }
  }
  return found;
}

export function pathOf(file: string): string {
  return `/${path.relative(path.join(ROOT, 'app'), path.dirname(file)).split(path.sep).join('/')}`;
}
