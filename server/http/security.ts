import helmet from 'helmet';
import type { RequestHandler } from 'express';

/**
 * Security headers. Everything comes from this server: no other host may be loaded from. Inline styles are React's
 * and the chart's; data: and blob: images are icons and the picture downloads of plots.
 *
 * @param https whether people reach the server by https; HSTS and upgrades would lock out a loopback server
 */
export function securityHeaders(https: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        frameAncestors: ["'none'"],
        upgradeInsecureRequests: https ? [] : null,
      },
    },
    strictTransportSecurity: https,
  });
}
