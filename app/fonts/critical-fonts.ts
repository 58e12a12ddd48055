import sans from './sans-400.woff2?url';
import head from './serif-head-500.woff2?url';

/** The two faces that every page begins with, for the root's `links`. */
export const criticalFonts = [sans, head].map((href) => ({
  rel: 'preload',
  href,
  as: 'font',
  type: 'font/woff2',
  crossOrigin: 'anonymous' as const,
}));
