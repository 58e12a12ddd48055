/** What a person of the shop is: decides what they may do (see `rights.ts`). */
export type Role = 'proprietor' | 'technician' | 'desk';

/** A person of the shop, signed in. `number` stands for them in public; `freshAt` is their last sign-in. */
export interface StaffViewer {
  kind: 'staff';
  personId: string;
  role: Role;
  name: string;
  number: number;
  freshAt: Date;
}

/** An owner, bringer or payer of at least one case, signed in by code. */
export interface CustomerViewer {
  kind: 'customer';
  customerId: string;
  name: string;
}

/** Anyone who is not signed in. */
export interface PublicViewer {
  kind: 'public';
}

/** Who is asking. Every operation takes one first, and every query carries its scope. */
export type Viewer = StaffViewer | CustomerViewer | PublicViewer;

/** The viewer who is not signed in. */
export const PUBLIC: PublicViewer = { kind: 'public' };
