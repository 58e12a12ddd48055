import { createRequire } from 'node:module';
import { COLOUR, px } from './sheet.ts';

const require = createRequire(import.meta.url);

const FILES = {
  serif: 'source-serif-4/400Regular/SourceSerif4_400Regular.ttf',
  'serif-strong': 'source-serif-4/600SemiBold/SourceSerif4_600SemiBold.ttf',
  sans: 'source-sans-3/400Regular/SourceSans3_400Regular.ttf',
  'sans-strong': 'source-sans-3/600SemiBold/SourceSans3_600SemiBold.ttf',
  mono: 'source-code-pro/400Regular/SourceCodePro_400Regular.ttf',
  'mono-strong': 'source-code-pro/500Medium/SourceCodePro_500Medium.ttf',
} as const;

export type Face = keyof typeof FILES;

/** How a piece of text is set: size in points, leading as a multiple of it. */
export interface Style {
  face: Face;
  size: number;
  leading: number;
  colour: string;
  /** Added between signs, in points. */
  spacing?: number;
}

const style = (
  face: Face,
  pixels: number,
  leading: number,
  colour: string = COLOUR.ink,
): Style => ({
  face,
  size: px(pixels),
  leading,
  colour,
});

/** The styles of the page. Terms are never set below 9.5 points, digests not below 8.5. */
export const TYPE = {
  shop: style('serif-strong', 19, 1.2),
  place: style('sans', 12.67, 1.3, COLOUR.ink2),
  label: style('sans', 12.67, 1.35, COLOUR.ink2),
  code: style('mono-strong', 15.5, 1.35),
  title: { ...style('serif', 50, 1.15), spacing: px(-1.1) },
  lead: style('serif', 17.5, 1.45),
  caption: style('sans', 12.67, 1.3, COLOUR.onSpruce),
  heading: style('serif-strong', 17, 1.2),
  line: style('sans', 13.5, 1.35),
  name: style('sans', 13.5, 1.35, COLOUR.ink2),
  terms: style('serif', 13.2, 1.47),
  termsInFull: style('serif', 13.5, 1.45),
  claim: style('sans', 12.7, 1.45),
  sealed: style('serif-strong', 17, 1.2, COLOUR.verdigris),
  fact: style('sans', 12.67, 1.4),
  factLabel: style('sans', 12.67, 1.4, COLOUR.ink3),
  digest: style('mono', 11.4, 1.5),
  foot: style('sans', 12.67, 1.4, COLOUR.ink2),
} as const;

/** Ties the shipped fonts to a document; they are embedded as subsets. */
export function registerFonts(doc: PDFKit.PDFDocument): void {
  for (const [face, file] of Object.entries(FILES)) {
    doc.registerFont(face, require.resolve(`@expo-google-fonts/${file}`));
  }
}
