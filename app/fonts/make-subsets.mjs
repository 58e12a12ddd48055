/**
 * Makes the font files that the pages ship, from the packages that the lock file pins:
 * `node app/fonts/make-subsets.mjs`. The serif is cut at three optical sizes (notes, headings, large
 * words), because one cut is either too thin at 17 px or too coarse at 84 px.
 */
import { readFile, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import subsetFont from 'subset-font';

const require = createRequire(import.meta.url);
const file = (name) => require.resolve(name);
const serif = file(
  '@fontsource-variable/source-serif-4/files/source-serif-4-latin-opsz-normal.woff2',
);
const serifItalic = file(
  '@fontsource-variable/source-serif-4/files/source-serif-4-latin-opsz-italic.woff2',
);
const serifExt = file(
  '@fontsource-variable/source-serif-4/files/source-serif-4-latin-ext-opsz-normal.woff2',
);
const sans = (weight, part = 'latin') =>
  file(`@fontsource/source-sans-3/files/source-sans-3-${part}-${weight}-normal.woff2`);
const mono = file('@fontsource/source-code-pro/files/source-code-pro-latin-400-normal.woff2');

const range = (from, to) =>
  Array.from({ length: to - from + 1 }, (_, i) => String.fromCodePoint(from + i)).join('');
const ascii = range(0x20, 0x7e);
const latin = `${ascii}${range(0xa0, 0xff)}‐‑–—‘’‚“”„…€−Œœ\u2009\u202f\u0131`;
const latinExt = `${range(0x100, 0x17f)}${range(0x218, 0x21b)}ẞẁẃẅỳ`;
const figures = '0123456789.,+−±°%–  ';
const largeWords =
  'Intact Does not match Not known Not fully checked Looks like Photo; proof ' +
  'In force Ended Suspended Withdrawn Replaced Has anything moved? 0123456789';

/** Kerning, ligatures and figures of one width; accented letters are glyphs of their own. */
const keepFeatures = ['kern', 'liga', 'tnum'];

const cuts = [
  ['serif-text-400', serif, latin, { opsz: 17, wght: 400 }],
  ['serif-head-500', serif, latin, { opsz: 28, wght: 500 }],
  ['serif-large-450', serif, largeWords, { opsz: 48, wght: 450 }],
  ['serif-figures-italic-400', serifItalic, figures, { opsz: 19, wght: 400 }],
  ['sans-400', sans(400), latin],
  ['sans-600', sans(600), latin],
  ['mono-400', mono, `${ascii}…–‑−`],
  ['serif-text-400-ext', serifExt, latinExt, { opsz: 17, wght: 400 }],
  ['serif-head-500-ext', serifExt, latinExt, { opsz: 28, wght: 500 }],
  ['sans-400-ext', sans(400, 'latin-ext'), latinExt],
  ['sans-600-ext', sans(600, 'latin-ext'), latinExt],
];

for (const [name, source, text, variationAxes] of cuts) {
  const bytes = await subsetFont(await readFile(source), text, {
    targetFormat: 'woff2',
    keepFeatures,
    noHinting: true,
    ...(variationAxes && { variationAxes }),
  });
  await writeFile(new URL(`./${name}.woff2`, import.meta.url), bytes);
  console.log(`${name}.woff2 ${bytes.length}`);
}
