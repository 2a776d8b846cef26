import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * Headers of every answer. Scripts and styles come from our own files only; React sets inline
 * styles through the CSSOM, which the policy does not touch. HSTS only where the site is HTTPS.
 */
export function securityHeaders(publicUrl: string): RequestHandler {
  const https = publicUrl.startsWith('https:');
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        // Blur placeholders are tiny data: pictures made by the server.
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'"],
        reportUri: ['/api/csp-reports'],
      },
    },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    strictTransportSecurity: https ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    xFrameOptions: { action: 'deny' },
  });
}

/** What the site never uses. */
export const permissionsPolicy: RequestHandler = (_request, response, next) => {
  response.set(
    'Permissions-Policy',
    'camera=(), microphone=(), geolocation=(), payment=(), usb=(), interest-cohort=()',
  );
  next();
};
