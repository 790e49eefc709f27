import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import type { RouteConfig } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import type { ZodType } from 'zod';
import { errorEnvelopeSchema } from '../../shared/error.ts';
import { SESSION_COOKIE } from '../auth/sessionCookie.ts';
import { isRowIdName, pathParamNames } from './pathParams.ts';
import type { Upload } from './readUpload.ts';
import type { Route } from './route.ts';

type RequestBody = NonNullable<RouteConfig['request']>['body'];
type Document = ReturnType<OpenApiGeneratorV31['generateDocument']>;

/** The OpenAPI 3.1 description of these routes, from the schemas that the requests are checked with. */
export function describeApi(routes: Route[], version: string): Document {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: SESSION_COOKIE,
    description: 'Set by POST /session.',
  });
  registry.registerComponent('securitySchemes', 'token', {
    type: 'http',
    scheme: 'bearer',
    description: 'An API token of the account page.',
  });
  for (const route of routes) registry.registerPath(describeRoute(route));
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Skewlight',
      version,
      description: 'Kerr and Faraday predictions for magnetic thin-film stacks.',
    },
    servers: [{ url: '/api/v1' }],
  });
}

function describeRoute(route: Route): RouteConfig {
  const names = pathParamNames(route.path);
  const params = z.object(
    Object.fromEntries(names.map((name) => [name, isRowIdName(name) ? z.uuid() : z.string()])),
  );
  const path = route.path.replace(/:(\w+)/g, '{$1}');
  return {
    method: route.method,
    path,
    tags: [path.split('/')[1]!],
    summary: route.summary,
    description: `Who: ${route.who}.`,
    security: securityOf(route),
    request: {
      ...(names.length > 0 && { params }),
      ...(route.query instanceof z.ZodObject && { query: route.query }),
      ...(route.body && { body: { required: true, content: contentOf(route.body, route.upload) } }),
    },
    responses: { [route.answer.status]: describeAnswer(route), default: refusal },
  };
}

/** What a request may carry: JSON, or a file where one is taken. */
function contentOf(body: ZodType, upload: Upload | null): NonNullable<RequestBody>['content'] {
  return {
    'application/json': { schema: body },
    ...(upload && {
      'multipart/form-data': {
        schema: {
          type: 'object' as const,
          required: [upload.part],
          additionalProperties: false,
          properties: {
            [upload.part]: {
              type: 'string' as const,
              format: 'binary',
              description: `One file of at most ${upload.maxBytes / 1e6} MB.`,
            },
          },
        },
      },
    }),
  };
}

const refusal = {
  description: 'Refused, in the one envelope.',
  content: { 'application/json': { schema: errorEnvelopeSchema } },
};

function describeAnswer({ answer, summary }: Route): RouteConfig['responses'][string] {
  if (answer.schema)
    return { description: summary, content: { 'application/json': { schema: answer.schema } } };
  if (answer.contentType === null) return { description: 'Done; no content.' };
  return { description: summary, content: { [answer.contentType]: { schema: { type: 'string' } } } };
}

function securityOf({ authentication }: Route): Record<string, string[]>[] {
  switch (authentication) {
    case 'none':
      return [];
    case 'session':
      return [{ session: [] }];
    case 'session or token':
      return [{ session: [] }, { token: [] }];
  }
}
