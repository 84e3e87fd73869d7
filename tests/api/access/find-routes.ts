import { readdirSync } from 'node:fs';
import path from 'node:path';
import type { Contract } from '@/lib/contracts/contract';

const root = path.resolve(import.meta.dirname, '../../..');

type RouteHandler = ((
  request: Request,
  context: { params: Promise<Record<string, string>> },
) => Promise<Response>) & {
  contract: Contract;
};

export interface FoundRoute {
  /** "GET /workspaces/{workspace}/animals" */
  name: string;
  file: string;
  handler: RouteHandler;
  contract: Contract;
}

/** Every handler of every route file under /api/v1, found in the file system. */
export async function findRoutes(): Promise<FoundRoute[]> {
  const files = readdirSync(path.join(root, 'app/api/v1'), { recursive: true, encoding: 'utf8' })
    .filter((file) => path.basename(file) === 'route.ts')
    .map((file) => path.join('app/api/v1', file))
    .sort();
  const found: FoundRoute[] = [];
  for (const file of files) {
    const bound = (await import(path.join(root, file))) as Record<string, RouteHandler>;
    for (const method of ['GET', 'POST', 'PUT', 'PATCH', 'DELETE']) {
      const handler = bound[method];
      if (handler)
        found.push({ name: `${method} ${pathOf(file)}`, file, handler, contract: handler.contract });
    }
  }
  return found;
}

/** The path of a route file as contracts write it: `[animal]` becomes `{animal}`. */
function pathOf(file: string): string {
  return file
    .replace(/^app\/api\/v1/, '')
    .replace(/\/route\.ts$/, '')
    .replace(/\[(\w+)\]/g, '{$1}');
}
