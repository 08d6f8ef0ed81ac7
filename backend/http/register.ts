import type { Request, RequestHandler, Response, Router } from 'express';
import { type ApiRoute, mayCall } from '../contract';
import { Forbidden } from '../errors/app-error';
import { signedInMember } from './member';

/** Registers a route of the access table with the guard that the table asks for. */
export function register(
  router: Router,
  route: ApiRoute,
  handler: (req: Request, res: Response) => Promise<void> | void,
  ...before: readonly RequestHandler[]
): void {
  const guard: RequestHandler = (req, _res, next) => {
    if (route.allow !== 'anyone' && !mayCall(route, signedInMember(req).roles))
      throw new Forbidden();
    next();
  };
  const handle: RequestHandler = (req, res) => handler(req, res);
  const chain = [guard, ...before, handle];
  switch (route.method) {
    case 'GET':
      router.get(route.path, ...chain);
      break;
    case 'POST':
      router.post(route.path, ...chain);
      break;
    case 'PUT':
      router.put(route.path, ...chain);
      break;
    case 'DELETE':
      router.delete(route.path, ...chain);
      break;
  }
}

/** A path parameter that must be a UUID; anything else is as unknown as an id of another workspace. */
export function idParameter(req: Request, name: string): string {
  const value = req.params[name];
  return typeof value === 'string' && uuid.test(value) ? value : nowhere;
}

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;
const nowhere = '00000000-0000-0000-0000-000000000000';
