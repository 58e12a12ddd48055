/** The left half-stroke in a 24 x 24 box with the joint at x = 12; the right one is turned 180° about (12, 12). */
export const HALF = 'M10.4 10.55V14.6L1.75 17.05A.62.62 0 0 1 1.3 15.9Z';
/** A heavier cut for 20 px and less. */
export const HALF_SMALL = 'M10 9.9V15.1L2 17.6A.95.95 0 0 1 1.3 15.85Z';
/** The half on the spine, in a 16 x 18 box. */
export const HALF_TICK = 'M15.5 5.6V12.4L1.7 17.2A1.1 1.1 0 0 1 .9 15.15Z';
/** The half beside a verdict, in a 126 x 86 box. */
export const HALF_LARGE = 'M124.5 26V62L5 85.3A5 5 0 0 1 2.6 75.5Z';
