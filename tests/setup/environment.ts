import { inject } from 'vitest';
import { freshEnvironment } from './fresh-names.ts';

// Runs before each test file: a complete environment of its own, so that settings can be read at any time.
const services = inject('services');
const { NODE_ENV: _production, ...environment } = freshEnvironment(services, {
  port: 3000,
  issuer: 'http://127.0.0.1:1',
  smtpUrl: services.smtpUrl,
});
Object.assign(process.env, environment, { LOG_LEVEL: 'silent' });
