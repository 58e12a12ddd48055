import { createRequire } from 'node:module';

// s3rver is CommonJS, and its class inherits a property `default` that confuses an import of it.
const require = createRequire(import.meta.url);

export const S3rver = require('s3rver') as typeof import('s3rver').default;
export const FilesystemStore =
  require('s3rver/lib/stores/filesystem') as typeof import('s3rver/lib/stores/filesystem').default;
export const S3Error =
  require('s3rver/lib/models/error') as typeof import('s3rver/lib/models/error').default;
export const S3Object =
  require('s3rver/lib/models/object') as typeof import('s3rver/lib/models/object').default;
export const { DUMMY_ACCOUNT } =
  require('s3rver/lib/models/account') as typeof import('s3rver/lib/models/account');
