import { Form, Link } from 'react-router';
import type { FieldOf } from '#app/lib/field-of.ts';
import { Button } from '#app/ui/control/button.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import type { FoundCustomer } from '#server/customers/find-customers.ts';
import { CustomerFields } from './customer-fields.tsx';
import { FormSection } from './form-section.tsx';

const reach = ({ email, telephone }: FoundCustomer) =>
  [email, telephone].filter((way) => way !== null).join(', ');

/** What was searched for, and whom it found. */
export interface OwnerSearch {
  words: string;
  found: FoundCustomer[];
}

/** Looks for a customer: a form of its own, before the one that takes in. */
export function FindOwner({ words, found }: OwnerSearch) {
  return (
    <section aria-labelledby="find-owner" className="grid gap-4 pb-7">
      <h2 id="find-owner" className="sr-only">
        Find the owner
      </h2>
      <Form
        className="flex flex-wrap items-end gap-3"
        role="search"
        aria-label="Owners"
        preventScrollReset
      >
        <div className="min-w-0 flex-1 basis-64">
          <TextField
            label="Has the owner been here before?"
            help="A part of the name, the e-mail address or the telephone number."
            name="find"
            type="search"
            defaultValue={words}
            maxLength={160}
          />
        </div>
        <div className="pb-7">
          <Button icon="search">Find</Button>
        </div>
      </Form>
      {words !== '' && found.length === 0 && (
        <p role="status">Nobody is on record under “{words}”. Write them down below.</p>
      )}
      {found.length > 0 && (
        <ul className="grid gap-2" aria-label="Customers found">
          {found.map((customer) => (
            <li key={customer.id}>
              <Link
                to={`?owner=${customer.id}`}
                preventScrollReset
                className="panel flex min-h-14 flex-wrap items-center gap-x-4 px-4 py-2 no-underline"
              >
                <b>{customer.name}</b>
                <span className="text-label text-ink-2">{reach(customer)}</span>
              </Link>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

/** The owner: chosen, or written down. */
export function OwnerSection({ owner, field }: { owner: FoundCustomer | null; field: FieldOf }) {
  return (
    <FormSection title="Owner" sub="Whose instrument it is.">
      {owner ? (
        <div className="panel flex flex-wrap items-center justify-between gap-3 px-4 py-3">
          <input type="hidden" name="owner.id" value={owner.id} />
          <p>
            <b>{owner.name}</b>
            <span className="block text-label text-ink-2">{reach(owner)}</span>
          </p>
          <Link to="/bench/take-in" preventScrollReset>
            Somebody else
          </Link>
        </div>
      ) : (
        <CustomerFields part="owner" field={field} />
      )}
    </FormSection>
  );
}
