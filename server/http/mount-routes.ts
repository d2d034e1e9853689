import type { Express, RequestHandler } from 'express';
import multer from 'multer';
import type { z } from 'zod';
import { isPermitted } from '#domain/access/role-matrix';
import type { Actor } from '../platform/actor';
import { InvalidInput, NotAllowed, NotSignedIn, type FieldProblem } from '../platform/errors';
import type { FileReply, Route, Services } from './define-route';
import type { Request } from 'express';

export type ResolveActor = (request: Request) => Promise<Actor | null>;

function pointerOf(where: string, path: readonly PropertyKey[]): string {
  return `/${[where, ...path.map(String)].join('/')}`;
}

function parse(schema: z.ZodType | null, value: unknown, where: string): unknown {
  if (!schema) return undefined;
  const read = schema.safeParse(value);
  if (read.success) return read.data;
  const fields: FieldProblem[] = read.error.issues.slice(0, 20).map((issue) => ({
    pointer: pointerOf(where, issue.path),
    detail: issue.message,
  }));
  const first = fields[0];
  throw new InvalidInput(
    'request.not-understood',
    first ? `${first.pointer.split('/').slice(2).join(' ') || where}: ${first.detail}` : 'This request cannot be read.',
    { fields },
  );
}

async function requireActor(route: Route, request: Request, resolveActor: ResolveActor): Promise<Actor | null> {
  if (route.access === 'public') return null;
  const actor = await resolveActor(request);
  if (!actor) throw new NotSignedIn('session.none', 'Nobody is signed in here. Scan your badge or sign in.');
  if (route.access !== 'signed-in' && !isPermitted(actor.role, route.access)) {
    throw new NotAllowed('access.not-permitted', 'Your role does not allow this.');
  }
  return actor;
}

function handlerOf(route: Route, services: Services, resolveActor: ResolveActor): RequestHandler {
  return async (request, response) => {
    const actor = await requireActor(route, request, resolveActor);
    const input = {
      services,
      actor,
      params: parse(route.schemas.params, request.params, 'params'),
      query: parse(route.schemas.query, request.query, 'query'),
      body: parse(route.schemas.body, request.body ?? {}, 'body'),
      file: request.file?.buffer ?? null,
      request,
    } as Parameters<Route['handle']>[0];
    const reply = await route.handle(input);
    response.set('cache-control', 'no-store');
    if (route.schemas.response === 'nothing') {
      response.status(route.status).end();
      return;
    }
    if (route.schemas.response === 'file') {
      const { file, mediaType, name } = reply as FileReply;
      response.status(route.status).type(mediaType).set('content-disposition', `inline; filename="${name}"`).send(file);
      return;
    }
    // The reply is parsed too, so that a column cannot leak.
    response.status(route.status).json(route.schemas.response.parse(reply));
  };
}

/** A write must come from our own pages: a foreign form cannot set this header (OWASP, custom request headers). */
const requireOwnHeader: RequestHandler = (request, _response, next) => {
  if (request.method === 'GET' || request.method === 'HEAD' || request.get('x-requested-with') === 'paperside') {
    next();
    return;
  }
  next(new NotAllowed('request.foreign', 'This request did not come from Paperside.'));
};

/** Takes one file, and says in our words when the form around it cannot be read: its parser throws bare errors for that. */
function uploadHandler(greatestBytes: number): RequestHandler {
  const take = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: greatestBytes, files: 1, fields: 20 },
  }).single('file');
  return (request, response, next) => {
    take(request, response, (error: unknown) => {
      if (error instanceof Error && !(error instanceof multer.MulterError)) {
        next(
          new InvalidInput('file.not-understood', 'This upload is cut off. Choose the file and send it again.', {
            cause: error,
          }),
        );
      } else next(error);
    });
  };
}

export function mountRoutes(
  app: Express,
  routes: readonly Route[],
  services: Services,
  resolveActor: ResolveActor,
): void {
  for (const route of routes) {
    const upload = route.upload ? [uploadHandler(route.upload.greatestBytes)] : [];
    // Whoever may not do it does not get to send a file either.
    const guard: RequestHandler = async (request, _response, next) => {
      await requireActor(route, request, resolveActor);
      next();
    };
    app[route.method](
      route.path,
      requireOwnHeader,
      ...(upload.length > 0 ? [guard] : []),
      ...route.before,
      ...upload,
      handlerOf(route, services, resolveActor),
    );
  }
}
