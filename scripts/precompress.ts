import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { brotliCompressSync, constants } from 'node:zlib';
import type { Plugin } from 'vite';

/**
 * Puts a `.br` file beside each script, style and drawing of the client build, compressed as far as
 * Brotli goes: once here instead of less well at every request.
 */
export function precompress(): Plugin {
  return {
    name: 'precompress',
    apply: 'build',
    applyToEnvironment: ({ name }) => name === 'client',
    writeBundle({ dir = '' }, bundle) {
      for (const file of Object.values(bundle)) {
        if (!/\.(?:js|css|svg)$/.test(file.fileName)) continue;
        const text = file.type === 'chunk' ? file.code : file.source;
        const bytes = brotliCompressSync(text, {
          params: { [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY },
        });
        writeFileSync(join(dir, `${file.fileName}.br`), bytes);
      }
    },
  };
}
