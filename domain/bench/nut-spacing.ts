import { BadReading, inPlace } from './bad-reading.ts';
import type { About } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Less than this between two strings or courses is too crowded to finger: common practice. */
export const LEAST_GAP_MM = 3;
/** Gap within a pair of a mandolin, mm: common practice (1.8 to 2.2). */
export const PAIR_GAP_MM = 2;

const ABOUT_SPACING: About = {
  formula: 'gap = (W − sum of gauges) / (n − 1)',
  basis: 'common practice',
  source:
    'Arithmetic of the layout; equal gaps rather than equal centres is common practice. Cut to ±0.1 mm',
};

export interface NutSpacing {
  /** Between neighbouring strings, equal, mm. */
  gapMm: number;
  /** Centres from the outer edge of the first string, mm, for equal gaps. */
  centresMm: number[];
  /** The other way of dividing: equal steps between centres, and the gaps that leaves. */
  equalStepCentresMm: number[];
  equalStepGapsMm: number[];
  about: About;
}

/**
 * Slot centres across the nut, from the outer edge of the first string: equal gaps
 * g = (W − Σd)/(n − 1), centre_i = d_i/2 + Σ_{j<i} (d_j + g); and equal centres beside it.
 * @param outerWidthMm W, outside of the first string to outside of the last, 15 to 80 mm
 * @param gaugesMm diameters, first string first, at least two
 * @throws BadReading outside these ranges, and `impossible` when the gaps fall below 3 mm
 * Source: arithmetic, computed; that gaps rather than centres are made equal is common practice.
 */
export function nutSpacing(outerWidthMm: number, gaugesMm: readonly number[]): NutSpacing {
  const courses = gaugesMm.map((gauge) => [gauge]);
  const { gapMm, centresMm } = courseSpacing(outerWidthMm, courses, PAIR_GAP_MM);
  const first = gaugesMm[0] ?? 0;
  const last = gaugesMm.at(-1) ?? 0;
  const stepMm = (outerWidthMm - first / 2 - last / 2) / (gaugesMm.length - 1);
  const equalStepCentresMm = gaugesMm.map((_, index) => first / 2 + index * stepMm);
  const equalStepGapsMm = gaugesMm
    .slice(1)
    .map((gauge, index) => stepMm - gauge / 2 - (gaugesMm[index] ?? 0) / 2);
  return { gapMm, centresMm, equalStepCentresMm, equalStepGapsMm, about: ABOUT_SPACING };
}

export interface CourseSpacing {
  /** Between neighbouring courses, mm. */
  gapMm: number;
  /** Centres of all strings in order, from the outer edge of the first, mm. */
  centresMm: number[];
  about: About;
}

/**
 * Slot centres for courses of one or more strings: `pairGapMm` inside a course, equal gaps between
 * courses.
 * @param courses diameters in mm, course by course, first string first, at least two courses
 * @throws BadReading as `nutSpacing`
 * Source: arithmetic, computed; gap of a pair common practice.
 */
export function courseSpacing(
  outerWidthMm: number,
  courses: readonly (readonly number[])[],
  pairGapMm = PAIR_GAP_MM,
): CourseSpacing {
  within('nutWidth', outerWidthMm);
  within('pairGap', pairGapMm);
  const strings = courses.flat();
  if (courses.length < 2 || courses.some((course) => course.length === 0)) {
    throw new BadReading({
      code: 'impossible',
      field: 'gauges',
      sentence: 'Strings: spacing needs at least two strings. Enter the gauge of every string.',
    });
  }
  strings.forEach((gauge, index) =>
    inPlace('gauges', index, `String ${index + 1}`, () => within('gauge', gauge)),
  );
  const metalMm = strings.reduce((sum, gauge) => sum + gauge, 0);
  const insideMm = courses.reduce((sum, course) => sum + (course.length - 1) * pairGapMm, 0);
  const gapMm = (outerWidthMm - metalMm - insideMm) / (courses.length - 1);
  if (gapMm < LEAST_GAP_MM) throw crowded(outerWidthMm, gapMm);
  const centresMm: number[] = [];
  let edgeMm = 0;
  for (const course of courses) {
    course.forEach((gauge, index) => {
      centresMm.push(edgeMm + gauge / 2);
      edgeMm += gauge + (index < course.length - 1 ? pairGapMm : gapMm);
    });
  }
  return { gapMm, centresMm, about: ABOUT_SPACING };
}

function crowded(outerWidthMm: number, gapMm: number): BadReading {
  return new BadReading({
    code: 'impossible',
    field: 'nutWidth',
    sentence: `Nut: strings too crowded for this width, ${plainAmount(outerWidthMm, 'mm')} leaves gaps of ${plainAmount(gapMm, 'mm')} and ${LEAST_GAP_MM} mm is the least. Check the width and the gauges.`,
  });
}
