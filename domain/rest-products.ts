import type { RestHours } from './rest-times.ts';

/** An adhesive or finish with the waits the shop starts from. */
export interface RestProduct extends RestHours {
  name: string;
  /** What else common practice says of it. */
  note: string;
}

/** Stands beside every suggested time. */
export const REST_CAUTION = 'Common practice; follow the label of the product in your hand.';

const product = (
  name: string,
  clampsOffHours: string | null,
  workedHours: string | null,
  stringsHours: string | null,
  note: string,
): RestProduct => ({ name, clampsOffHours, workedHours, stringsHours, note });

/**
 * Waits in hours at about 20 °C: common practice in the trade, without a published source. Of each
 * range, clamps and strings take the longer end and the next step the shorter one; a finish has no
 * clamps and says nothing of strings. The label of the product in hand overrides every one.
 */
export const REST_PRODUCTS: readonly RestProduct[] = [
  product(
    'Hot hide glue',
    '12',
    '24',
    '48',
    'Clamps 2 to 4 h, best overnight. Parts and room at 20 °C or more.',
  ),
  product('Liquid hide or fish glue', '12', '24', '48', 'Check its date; a test drop must harden.'),
  product(
    'Wood glue, aliphatic',
    '24',
    '24',
    '24',
    'Unstressed joints 0.5 to 1 h. Minimum temperature on the label, commonly 7 to 13 °C.',
  ),
  product('Epoxy, 5 minutes', '1', '24', '24', 'Weigh, mix fully.'),
  product('Epoxy, slow', '24', '72', '168', 'Not below 10 to 15 °C.'),
  product('Cyanoacrylate', null, '8', '24', 'Holds in seconds to minutes; brittle.'),
  product('Polyurethane glue', '4', '24', '24', 'Needs moisture; foam is not strength.'),
  product(
    'Nitrocellulose lacquer',
    null,
    '48',
    null,
    'Sand after 2 to 3 days, rub out after 14 to 30. Not above 65 % humidity.',
  ),
  product(
    'Shellac, French polish',
    null,
    '168',
    null,
    '1 to 4 weeks. Dissolved over 6 to 12 months it may stay soft.',
  ),
  product(
    'Oil varnish, drying oil',
    null,
    '336',
    null,
    '24 h a coat, 2 to 6 weeks in all. Oily rags heat up by themselves.',
  ),
  product(
    'Water-borne finish',
    null,
    '336',
    null,
    'Recoat after 1 to 2 h, 2 to 4 weeks in all. 15 °C or more.',
  ),
  product(
    'Two-part polyurethane',
    null,
    '72',
    null,
    '3 to 7 days. Isocyanate: read its safety data sheet.',
  ),
];
