import type { Permission } from '#domain/access/permissions';
import type { Request, RequestHandler } from 'express';
import type { z } from 'zod';
import type { Actor } from '../platform/actor';
import type { Clock } from '../platform/clock';
import type { Db } from '../platform/db';
import type { Ids } from '../platform/ids';
import type { Logger } from '../platform/logger';

/** What the composition root hands to every use case. */
export type Services = {
  readonly db: Db;
  readonly clock: Clock;
  readonly ids: Ids;
  readonly logger: Logger;
};

/** `public` needs nobody, `signed-in` anybody; otherwise the permission the role must have. There is no default. */
export type RouteAccess = Permission | 'public' | 'signed-in';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

export type FileReply = {
  readonly file: Buffer;
  readonly mediaType: 'application/pdf' | 'text/csv; charset=utf-8';
  readonly name: string;
};

export type RouteInput<Params, Query, Body, Access extends RouteAccess> = {
  readonly services: Services;
  readonly actor: Access extends 'public' ? null : Actor;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  /** Bytes of the uploaded file, on routes that take one. */
  readonly file: Buffer | null;
  /** The session and the address asking: for signing in and out only. */
  readonly request: Request;
};

export type Route = {
  readonly method: Method;
  readonly path: string;
  readonly access: RouteAccess;
  readonly upload: { readonly greatestBytes: number } | null;
  readonly schemas: {
    readonly params: z.ZodType | null;
    readonly query: z.ZodType | null;
    readonly body: z.ZodType | null;
    readonly response: z.ZodType | 'file' | 'nothing';
  };
  readonly status: number;
  readonly before: readonly RequestHandler[];
  readonly handle: (input: RouteInput<unknown, unknown, unknown, RouteAccess>) => Promise<unknown>;
};

type Output<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined;
type Reply<Response> = Response extends z.ZodType ? z.input<Response> : Response extends 'file' ? FileReply : undefined;

type RouteSpec<
  Access extends RouteAccess,
  Params extends z.ZodType | undefined,
  Query extends z.ZodType | undefined,
  Body extends z.ZodType | undefined,
  Response extends z.ZodType | 'file' | 'nothing',
> = {
  readonly method: Method;
  /** Express path, beginning with /api. */
  readonly path: string;
  readonly permission: Access;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** Schema of the reply; `file` for a document; `nothing` for 204. */
  readonly response: Response;
  readonly status?: number;
  readonly upload?: { readonly greatestBytes: number };
  /** Handlers that must run first, such as a limiter. Rare. */
  readonly before?: readonly RequestHandler[];
  readonly handle: (input: RouteInput<Output<Params>, Output<Query>, Output<Body>, Access>) => Promise<Reply<Response>>;
};

/** States method, address, permission and schemas of one route, and hands over to one use case. */
export function defineRoute<
  const Access extends RouteAccess,
  const Response extends z.ZodType | 'file' | 'nothing',
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(spec: RouteSpec<Access, Params, Query, Body, Response>): Route {
  return {
    method: spec.method,
    path: spec.path,
    access: spec.permission,
    upload: spec.upload ?? null,
    schemas: {
      params: spec.params ?? null,
      query: spec.query ?? null,
      body: spec.body ?? null,
      response: spec.response,
    },
    status: spec.status ?? (spec.response === 'nothing' ? 204 : 200),
    before: spec.before ?? [],
    // The mounted route parses with these very schemas before it calls, so the types hold.
    handle: spec.handle as Route['handle'],
  };
}
