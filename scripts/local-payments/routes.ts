import { ApiError } from './api-error';
import { accountRoutes } from './routes-account';
import { checkoutRoutes } from './routes-checkout';
import { disputeRoutes } from './routes-disputes';
import { paymentRoutes } from './routes-payments';
import type { Handler, Routes } from './route';

const routes: Routes = { ...checkoutRoutes, ...paymentRoutes, ...disputeRoutes, ...accountRoutes };

const table = Object.entries(routes).map(([name, handler]) => {
  const [method = '', path = ''] = name.split(' ');
  return { method, pattern: new RegExp(`^${path.replace(':id', '([^/]+)')}$`), handler };
});

export function findRoute(method: string, path: string): { handler: Handler; id: string } {
  for (const route of table) {
    const match = route.method === method ? route.pattern.exec(path) : null;
    if (match !== null) return { handler: route.handler, id: decodeURIComponent(match[1] ?? '') };
  }
  throw new ApiError(404, {
    type: 'invalid_request_error',
    message: `Unrecognized request URL (${method}: ${path}). This local server knows a part of the API only.`,
  });
}
