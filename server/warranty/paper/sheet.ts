/** Points in a millimetre. */
export const MM = 72 / 25.4;

/**
 * The page is laid out in CSS pixels of an A4 sheet (794 × 1123), as its drawing is; a PDF counts in
 * points.
 */
export const px = (pixels: number): number => pixels * 0.75;

/** A4, in points. */
export const PAGE = { width: 595.28, height: 841.89 };

/** The box the text keeps to. */
export const INNER = {
  left: px(72),
  right: px(722),
  top: px(62),
  bottom: px(1066),
  width: px(650),
};

/** Ink and paper of the printed page: always light. */
export const COLOUR = {
  ink: '#1E1B1A',
  ink2: '#474B4D',
  ink3: '#5D6365',
  line: '#D2D9D9',
  verdigris: '#11625B',
  spruce: '#E6D9BC',
  spruceEdge: '#C7B48A',
  onSpruce: '#463B25',
  bevel: '#F6F0E0',
} as const;
