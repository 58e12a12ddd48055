import { pathToFileURL } from 'node:url';

interface BuiltRoute {
  id: string;
  parentId?: string;
  path?: string;
  module: Record<string, unknown>;
}

/** A route that an address can lead to, as it was built. */
export interface Leaf {
  pattern: string;
  /** It and what it lies in, outermost first. */
  modules: Record<string, unknown>[];
  hasAction: boolean;
  isPage: boolean;
}

/** The routes of the build in build/server, read from the build itself. */
export async function builtRoutes(): Promise<Leaf[]> {
  const built = (await import(pathToFileURL('build/server/index.js').href)) as {
    serverBuild(): Promise<{ routes: Record<string, BuiltRoute> }>;
  };
  const { routes } = await built.serverBuild();
  const all = Object.values(routes);
  const lineOf = (route: BuiltRoute): BuiltRoute[] => {
    const parent = route.parentId === undefined ? undefined : routes[route.parentId];
    return [...(parent === undefined ? [] : lineOf(parent)), route];
  };
  return all
    .filter(({ id }) => id !== 'root' && !all.some(({ parentId }) => parentId === id))
    .map((route) => {
      const line = lineOf(route);
      const modules = line.map(({ module }) => module);
      return {
        pattern: `/${line.flatMap(({ path }) => path || []).join('/')}`,
        modules,
        hasAction: modules.some((module) => 'action' in module),
        isPage: 'default' in route.module,
      };
    });
}
