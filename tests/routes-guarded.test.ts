import 'reflect-metadata';

import { RequestMethod, type DynamicModule, type Type } from '@nestjs/common';
import { METHOD_METADATA, MODULE_METADATA, PATH_METADATA } from '@nestjs/common/constants.js';
import { MetadataScanner } from '@nestjs/core';
import { describe, expect, it } from 'vitest';

import { workspaceActions } from '#common/policies/workspace-policy';
import { AppModule } from '#server/app.module';
import { ROUTE_ACCESS, type RouteAccess } from '#server/http/access.decorators';

type ModuleImport = Type | DynamicModule | Promise<DynamicModule>;

interface Route {
  readonly name: string;
  readonly path: string;
  readonly access: RouteAccess | undefined;
}

const read = <T>(key: string, target: object): T | undefined =>
  Reflect.getMetadata(key, target) as T | undefined;

/** Every controller that the application is made of, through all its modules. */
async function controllersOf(
  root: ModuleImport,
  seen = new Set<unknown>(),
): Promise<Set<Type<object>>> {
  const found = new Set<Type<object>>();
  const resolved = await root;
  if (seen.has(resolved)) {
    return found;
  }
  seen.add(resolved);
  const isDynamic = typeof resolved !== 'function';
  const type = isDynamic ? resolved.module : resolved;
  const declared = [
    ...(read<Type<object>[]>(MODULE_METADATA.CONTROLLERS, type) ?? []),
    ...(isDynamic ? (resolved.controllers ?? []) : []),
  ];
  declared.forEach((controller) => found.add(controller as Type<object>));
  const imports = [
    ...(read<ModuleImport[]>(MODULE_METADATA.IMPORTS, type) ?? []),
    ...(isDynamic ? (resolved.imports ?? []) : []),
  ];
  for (const next of imports) {
    const below = await controllersOf(next as ModuleImport, seen);
    below.forEach((controller) => found.add(controller));
  }
  return found;
}

function routesOf(controller: Type<object>): Route[] {
  const prototype = controller.prototype as Record<string, object>;
  return new MetadataScanner()
    .getAllMethodNames(prototype)
    .map((method) => ({ handler: prototype[method]! }))
    .filter(({ handler }) => read(METHOD_METADATA, handler) !== undefined)
    .map(({ handler }) => {
      const base = read<string>(PATH_METADATA, controller) ?? '';
      const path = `${base}/${read<string>(PATH_METADATA, handler) ?? ''}`.replace(/\/+/g, '/');
      const verb = RequestMethod[read<number>(METHOD_METADATA, handler)!];
      return {
        name: `${verb} /${path.replace(/^\/|\/$/g, '')}`,
        path,
        access: read<RouteAccess>(ROUTE_ACCESS, handler) ?? read(ROUTE_ACCESS, controller),
      };
    });
}

const routes = [...(await controllersOf(AppModule))].flatMap(routesOf);

/** Open to anyone; a route that joins this list is seen in review. */
const publicRoutes = [
  'GET /health',
  'GET /session',
  'POST /session',
  'POST /setup',
  'GET /invitations/:token',
  'POST /invitations/:token/accept',
  'GET /shares/:token',
  'GET /shares/:token/report.pdf',
  'GET /space-groups',
  'GET /space-groups/:hallNumber',
];

describe('every route of the application', () => {
  it('is walked', () => {
    expect(routes.length).toBeGreaterThan(25);
  });

  it('declares who may call it', () => {
    expect(routes.filter(({ access }) => access === undefined)).toEqual([]);
  });

  it('is a member’s route exactly when its address names a workspace', () => {
    const wrong = routes.filter(
      ({ path, access }) =>
        (access?.kind === 'member') !== path.startsWith('workspaces/:workspace'),
    );
    expect(wrong).toEqual([]);
  });

  it('names an action that the policy knows', () => {
    for (const { access } of routes) {
      if (access?.kind === 'member') {
        expect(workspaceActions).toContain(access.action);
      }
    }
  });

  it('is public only where this list says so', () => {
    const open = routes.filter(({ access }) => access?.kind === 'public').map(({ name }) => name);
    expect(open.filter((name) => !publicRoutes.includes(name))).toEqual([]);
  });
});
