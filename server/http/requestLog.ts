import { randomUUID } from 'node:crypto';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line a request, under an id that the answer carries too (X-Request-Id, and the envelope of a 5xx). */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId(_request, response) {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    // Neither headers nor bodies: they hold passwords, cookies and tokens.
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        url: withoutSecrets(request.url),
      }),
      res: (response: { statusCode: number }) => ({ statusCode: response.statusCode }),
    },
    customLogLevel(_request, response, error) {
      if (error || response.statusCode >= 500) return 'error';
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
  });
}

/** The address of a share link or a reset mail is a key: the log must not hand it on. */
function withoutSecrets(url: string): string {
  return url.replace(/\/(shared?|reset-password)\/[^/?#]+/g, '/$1/***');
}
