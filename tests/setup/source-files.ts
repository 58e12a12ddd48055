import { readFileSync, readdirSync } from 'node:fs';
import { dirname, join, normalize } from 'node:path';
import ts from 'typescript';

/** One source file with what it imports, as paths from the project's folder or package names. */
export interface SourceFile {
  path: string;
  text: string;
  imports: { written: string; target: string }[];
}

const folders = ['app', 'domain', 'evidence', 'server', 'local', 'seeds', 'scripts', 'tests'];

/** Every TypeScript and module file of the project. */
export function sourceFiles(): SourceFile[] {
  return folders
    .flatMap((folder) =>
      readdirSync(folder, { recursive: true, encoding: 'utf8' }).map((name) => join(folder, name)),
    )
    .filter((path) => /\.(?:tsx?|mjs)$/.test(path))
    .map((path) => readSource(path, readFileSync(path, 'utf8')));
}

/** What a file of this name and text imports: static and dynamic imports, re-exports and type imports alike. */
export function readSource(path: string, text: string): SourceFile {
  const { importedFiles } = ts.preProcessFile(text, true, true);
  return {
    path,
    text,
    imports: importedFiles.map(({ fileName: written }) => ({
      written,
      target: resolveImport(path, written),
    })),
  };
}

function resolveImport(from: string, written: string): string {
  if (written.startsWith('#')) return written.slice(1);
  if (written.startsWith('.')) return normalize(join(dirname(from), written));
  return written;
}
