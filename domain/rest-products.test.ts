import { describe, expect, it } from 'vitest';
import { RestDraftSchema } from './entry-draft.ts';
import { REST_CAUTION, REST_PRODUCTS } from './rest-products.ts';

describe('the products with their waits', () => {
  it.each(REST_PRODUCTS.map((product) => [product.name, product] as const))(
    '%s is a rest the timeline takes',
    (name, { clampsOffHours, workedHours, stringsHours }) => {
      const rest = { product: name, clampsOffHours, workedHours, stringsHours };
      expect(RestDraftSchema.parse(rest)).toEqual(rest);
    },
  );
  it('says where its figures come from and what goes before them', () => {
    expect(REST_CAUTION).toMatch(/Common practice; follow the label/);
  });
});
