import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';

function policy(nonce: string): string {
  return [
    "default-src 'none'",
    `script-src 'self' 'nonce-${nonce}'`,
    "style-src 'self'",
    // Pins, rest clocks and the photo viewer place things by style attributes.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "manifest-src 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    "base-uri 'none'",
  ].join('; ');
}

const ALWAYS = {
  'X-Content-Type-Options': 'nosniff',
  // Not no-referrer: a browser would then send `Origin: null` with the site's own forms.
  'Referrer-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(self), geolocation=(), microphone=(), payment=(), usb=()',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
};

/**
 * The headers every answer carries, and a fresh nonce in `res.locals.nonce`.
 * `https`: whether people reach the site by https, so that browsers may be told to insist on it.
 */
export function securityHeaders({ https }: { https: boolean }): RequestHandler {
  return (_request, response, next) => {
    const nonce = randomBytes(16).toString('base64');
    response.locals.nonce = nonce;
    response.set(ALWAYS);
    response.set('Content-Security-Policy', policy(nonce));
    if (https) response.set('Strict-Transport-Security', 'max-age=31536000');
    next();
  };
}
