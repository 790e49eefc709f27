import type { Request, Response } from 'express';
import type { Logger } from 'pino';
import type {} from 'pino-http';
import type { ZodType, z } from 'zod';
import type { AppDependencies } from '../dependencies.ts';
import { notFound } from '../errors.ts';
import type { Actor } from '../policies/actor.ts';
import type { Policy } from '../policies/policy.ts';
import { requireAllowed } from '../policies/requireAllowed.ts';
import { assertAnswer } from './assertAnswer.ts';
import { readPathParams } from './pathParams.ts';
import type { PathParams } from './pathParams.ts';
import { readBody, readQuery } from './readRequest.ts';
import { readUpload } from './readUpload.ts';
import type { Upload, UploadedFile } from './readUpload.ts';
import { refuseForgedRequest } from './refuseForgedRequest.ts';

type Method = 'get' | 'post' | 'patch' | 'delete';

/** What a handler and a loader may use. `query` and `body` have passed their schemas. */
export type RouteContext<Path extends string, Body, Query, Who> = {
  dependencies: AppDependencies;
  /** Carries the request id. */
  log: Logger;
  actor: Who;
  params: PathParams<Path>;
  body: Body;
  query: Query;
  request: Request;
  response: Response;
};

type Schema = ZodType | undefined;
type Output<Given> = Given extends ZodType ? z.output<Given> : undefined;

type Declaration<
  Path extends string,
  Body extends Schema,
  Query extends Schema,
  Who extends Actor | null,
  Subject,
> = {
  method: Method;
  /** Below /api/v1, in Express's words. A parameter named `...Id` must be a UUID; others are free text. */
  path: Path;
  /** A sentence for the API page. */
  summary: string;
  policy: Policy<Who, Subject>;
  body?: Body;
  query?: Query;
  /** Finds what the policy decides on; null answers 404. */
  load?: (context: RouteContext<Path, Output<Body>, Output<Query>, Who>) => Promise<Subject | null>;
  /** What was not found, in the words of a message: "stack". */
  noun?: string;
};

/** A declared route, its types erased: what is mounted, described in OpenAPI and checked in a test. */
export type Route = {
  method: Method;
  path: string;
  summary: string;
  who: string;
  authentication: Policy<Actor | null, never>['authentication'];
  body: ZodType | null;
  query: ZodType | null;
  /** Set where a file is taken instead of the body. */
  upload: Upload | null;
  /** `schema` for JSON, `contentType` alone for a file or stream, neither for an empty answer. */
  answer: { status: number; schema: ZodType | null; contentType: string | null };
  handle(request: Request, response: Response, services: RouteServices): Promise<void>;
};

export type RouteServices = {
  dependencies: AppDependencies;
  /** @throws Refusal 401 when there is a cookie or token that does not hold */
  authenticate: (request: Request, response: Response) => Promise<Actor | null>;
};

/**
 * Declares a route that answers JSON (or nothing, with status 204 and `schema: null`). The steps are the same for
 * all: authenticate, validate, load, authorize, then the handler, which presents.
 *
 * @example
 * export const getRun = route({
 *   method: 'get',
 *   path: '/runs/:runId',
 *   summary: 'One run with its progress.',
 *   noun: 'run',
 *   policy: readRun, // policies/run.ts: outside the group 404, wrong role 403, no session 401
 *   load: ({ dependencies, params }) => dependencies.models.Run.findByPk(params.runId),
 *   answer: { status: 200, schema: runSchema },
 *   handler: ({ subject }) => presentRun(subject),
 * });
 * // routes/runs/runRoutes.ts: export const runRoutes: Route[] = [getRun, ...]; listed in routes/allRoutes.ts.
 */
export function route<
  Path extends string,
  Who extends Actor | null,
  Answer extends ZodType | null,
  Body extends Schema = undefined,
  Query extends Schema = undefined,
  Subject = null,
>(
  declaration: Declaration<Path, Body, Query, Who, Subject> & {
    answer: { status: number; schema: Answer };
    handler: (
      context: RouteContext<Path, Output<Body>, Output<Query>, Who> & { subject: Subject },
    ) => Promise<NoInfer<AnswerOf<Answer>>> | NoInfer<AnswerOf<Answer>>;
  },
): Route {
  const { answer, handler } = declaration;
  return {
    ...describe(declaration),
    answer: { ...answer, contentType: answer.schema && 'application/json' },
    async handle(request, response, services) {
      const context = await prepare(declaration, request, response, services);
      const result = await handler(context);
      if (answer.schema === null) {
        response.status(answer.status).end();
        return;
      }
      if (services.dependencies.config.checkAnswers) assertAnswer(answer.schema, result);
      response.status(answer.status).json(result);
    },
  };
}

type AnswerOf<Given> = Given extends ZodType ? z.input<Given> : void;

/**
 * Declares a route that takes either one file as multipart/form-data or a JSON body, and answers JSON. Neither is
 * looked at before the asker is known to be allowed.
 */
export function uploadRoute<
  Path extends string,
  Who extends Actor | null,
  Answer extends ZodType,
  Body extends ZodType,
  Subject = null,
>(
  declaration: Omit<Declaration<Path, undefined, undefined, Who, Subject>, 'body'> & {
    upload: Upload;
    body: Body;
    answer: { status: number; schema: Answer };
    handler: (
      context: Omit<RouteContext<Path, undefined, undefined, Who>, 'body'> & {
        subject: Subject;
        given: { file: UploadedFile } | { body: z.output<Body> };
      },
    ) => Promise<NoInfer<AnswerOf<Answer>>>;
  },
): Route {
  const { upload, body, answer, handler, ...rest } = declaration;
  return {
    ...describe({ ...rest, body }),
    upload,
    answer: { ...answer, contentType: 'application/json' },
    async handle(request, response, services) {
      const context = await prepare<Path, undefined, undefined, Who, Subject>(
        rest,
        request,
        response,
        services,
        upload,
      );
      const given = request.is('multipart/form-data')
        ? { file: await readUpload(request, response, upload) }
        : // Exactly what this schema puts out.
          { body: readBody(body, request) as z.output<Body> };
      const result = await handler({ ...context, given });
      if (services.dependencies.config.checkAnswers) assertAnswer(answer.schema, result);
      response.status(answer.status).json(result);
    },
  };
}

/**
 * Declares a route whose handler writes the response itself: files, server-sent events. Everything before the
 * handler is as in `route`.
 */
export function streamRoute<
  Path extends string,
  Who extends Actor | null,
  Body extends Schema = undefined,
  Query extends Schema = undefined,
  Subject = null,
>(
  declaration: Declaration<Path, Body, Query, Who, Subject> & {
    answer: { contentType: string; schema?: ZodType };
    handler: (
      context: RouteContext<Path, Output<Body>, Output<Query>, Who> & { subject: Subject },
    ) => Promise<void> | void;
  },
): Route {
  return {
    ...describe(declaration),
    answer: { status: 200, schema: null, ...declaration.answer },
    async handle(request, response, services) {
      await declaration.handler(await prepare(declaration, request, response, services));
    },
  };
}

function describe<Who extends Actor | null, Subject>(declaration: {
  method: Method;
  path: string;
  summary: string;
  policy: Policy<Who, Subject>;
  body?: Schema;
  query?: Schema;
}): Omit<Route, 'answer' | 'handle'> {
  const { method, path, summary, policy, body, query } = declaration;
  return {
    method,
    path,
    summary,
    who: policy.who,
    authentication: policy.authentication,
    body: body ?? null,
    query: query ?? null,
    upload: null,
  };
}

async function prepare<
  Path extends string,
  Body extends Schema,
  Query extends Schema,
  Who extends Actor | null,
  Subject,
>(
  declaration: Declaration<Path, Body, Query, Who, Subject>,
  request: Request,
  response: Response,
  { dependencies, authenticate }: RouteServices,
  upload: Upload | null = null,
): Promise<RouteContext<Path, Output<Body>, Output<Query>, Who> & { subject: Subject }> {
  const { policy, noun = 'thing' } = declaration;
  const actor = policy.admit(policy.authentication === 'none' ? null : await authenticate(request, response));
  refuseForgedRequest(request, dependencies.publicUrl(), upload !== null);
  const context = {
    dependencies,
    log: request.log,
    actor,
    params: readPathParams(declaration.path, request.params, noun),
    // Exactly what these schemas put out.
    body: readBody(declaration.body, request) as Output<Body>,
    query: readQuery(declaration.query, request) as Output<Query>,
    request,
    response,
  };
  const loaded = declaration.load ? await declaration.load(context) : null;
  if (declaration.load && loaded === null) throw notFound(noun);
  // Without `load` there is nothing to decide on: such a policy takes any subject.
  const subject = loaded as Subject;
  requireAllowed(policy, actor, subject, noun);
  return { ...context, subject };
}
