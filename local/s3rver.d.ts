// The parts of s3rver 3.7.1 that the object store is built on; the package ships no types.

declare module 's3rver' {
  import type { RequestListener } from 'node:http';
  import type Store from 's3rver/lib/stores/filesystem';

  export interface Context {
    method: string;
    path: string;
    query: Record<string, string | undefined>;
    req: import('node:http').IncomingMessage;
    headers: Record<string, string | undefined>;
    status: number;
    body: unknown;
    store: Store;
  }

  export default class S3rver {
    constructor(options: {
      directory: string;
      silent: boolean;
      vhostBuckets: boolean;
      configureBuckets: { name: string }[];
    });
    store: Store;
    context: { store: Store };
    middleware: ((context: Context, next: () => Promise<void>) => Promise<void>)[];
    configureBuckets(): Promise<unknown>;
    callback(): RequestListener;
    on(event: 'error', listener: (error: Error) => void): void;
  }
}

declare module 's3rver/lib/stores/filesystem' {
  import type { Readable } from 'node:stream';

  export interface StoredObject {
    bucket: string;
    key: string;
    content: Readable | Buffer;
    metadata: Record<string, string>;
  }
  export interface Listing {
    objects: unknown[];
    commonPrefixes: string[];
    isTruncated: boolean;
  }

  export default class FilesystemStore {
    constructor(rootDirectory: string);
    rootDirectory: string;
    getBucketPath(bucket: string): string;
    getResourcePath(bucket: string, key: string | undefined, resource: string): string;
    getMetadata(bucket: string, key: string): Promise<Record<string, string | number>>;
    putMetadata(
      bucket: string,
      key: string,
      metadata: Record<string, string>,
      md5: string,
    ): Promise<void>;
    existsObject(bucket: string, key: string): Promise<boolean>;
    putObject(object: StoredObject): Promise<{ size: number; md5: string }>;
    putPart(
      bucket: string,
      uploadId: string,
      partNumber: string,
      content: Readable,
    ): Promise<{ size: number; md5: string }>;
    listObjects(
      bucket: string,
      options: { delimiter?: string; startAfter?: string; prefix?: string; maxKeys?: number },
    ): Promise<Listing>;
  }
}

declare module 's3rver/lib/models/error' {
  export default class S3Error extends Error {
    constructor(code: string, message: string, detail?: Record<string, unknown>);
  }
}

declare module 's3rver/lib/models/object' {
  export default class S3Object {
    constructor(bucket: string, key: string, content: null, metadata: object);
  }
}

declare module 's3rver/lib/models/account' {
  export const DUMMY_ACCOUNT: {
    createKeyPair(id: string, secret: string): void;
    revokeAccessKey(id: string): void;
  };
}
