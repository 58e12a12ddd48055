import { readdirSync, readFileSync } from 'node:fs';

const folder = new URL('../../docs/formats/', import.meta.url);

/** The names of all pages of docs/formats, without their ending. */
export const pages = readdirSync(folder).map((file) => file.replace(/\.md$/, ''));

type Block = { info: string; content: string };

/** The fenced blocks of a page, in order; their content is exact to the byte. */
function blocksOf(page: string): Block[] {
  const text = readFileSync(new URL(`${page}.md`, folder), 'utf8');
  return [...text.matchAll(/^```(.+)\n([\s\S]*?)^```$/gm)].map(([, info, content]) => {
    return { info: info!, content: content! };
  });
}

/** The one block of a page with that info string. */
export function blockOf(page: string, info: string): string {
  const found = blocksOf(page).filter((block) => block.info === info);
  if (found.length !== 1) throw new Error(`${page} has ${found.length} blocks "${info}".`);
  return found[0]!.content;
}

/** The lines of the one block of a page with that info string. */
export function linesOf(page: string, info: string): string[] {
  return blockOf(page, info).trimEnd().split('\n');
}

/**
 * The `example` blocks of a page: each line a name, two spaces or more, and a value. Asking for a
 * name that is not there fails.
 */
export function examplesOf(page: string): ((name: string) => string)[] {
  const examples = blocksOf(page).filter(({ info }) => info === 'example');
  if (examples.length === 0) throw new Error(`${page} has no example.`);
  return examples.map(({ content }) => {
    const values = new Map(
      content
        .trimEnd()
        .split('\n')
        .map((line) => {
          const [, name, value] = /^(.+?) {2,}(\S.*)$/.exec(line) ?? [];
          if (value === undefined) throw new Error(`${page} has an example line "${line}".`);
          return [name, value];
        }),
    );
    return (name) => {
      const value = values.get(name);
      if (value === undefined) throw new Error(`An example of ${page} has no "${name}".`);
      return value;
    };
  });
}
