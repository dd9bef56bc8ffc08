import { describe, expect, it } from 'vitest';
import { may, ROLES } from '@/lib/shared/permissions';
import { apiRoutes, pathOf, routeFiles } from '../support/api-routes';
import { ACCESS, OPEN_ROUTES } from './access-matrix';

const name = ({ method, path }: { method: string; path: string }) => `${method} ${path}`;
const routes = await apiRoutes();

describe('the table of who may call what', () => {
  it('has one line for every method of every route, and no line without a route', () => {
    expect(ACCESS.map(name).sort()).toEqual(routes.map(name).sort());
  });

  it('knows every route outside the API of a house', () => {
    const outside = routeFiles()
      .map(pathOf)
      .filter((path) => !path.startsWith('/api/v1/'));
    expect(outside).toEqual(Object.keys(OPEN_ROUTES).sort());
  });

  it('finds a guarded handler behind every method', () => {
    expect(routes.filter(({ handler }) => !handler.operation).map(name)).toEqual([]);
  });

  it('gives every operation a name of its own', () => {
    const ids = routes.map(({ handler }) => handler.operation?.id);
    expect(new Set(ids).size).toBe(ids.length);
  });
});

describe.each(ACCESS)('$method $path', (line) => {
  const operation = routes.find((route) => name(route) === name(line))?.handler.operation;

  it('is the operation that its line says', () => {
    expect(operation?.id).toBe(line.operation);
  });

  it('lets in exactly the roles of its line', () => {
    const letIn = ROLES.filter((role) => operation && may([role], operation.permission));
    expect(letIn).toEqual(ROLES.filter((role) => line.roles.includes(role)));
  });

  it('answers through a schema that names every field', () => {
    expect(operation?.result).toBeDefined();
  });
});
