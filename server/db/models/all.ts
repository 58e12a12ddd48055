import type { Sequelize } from 'sequelize';
import { AuditRecord } from './audit-record.ts';
import { Case } from './case.ts';
import { Customer } from './customer.ts';
import { Entry } from './entry.ts';
import { Estimate } from './estimate.ts';
import { Instrument } from './instrument.ts';
import { Outbox } from './outbox.ts';
import { Party } from './party.ts';
import { Person } from './person.ts';
import { PhotoCopy } from './photo-copy.ts';
import { Photo } from './photo.ts';
import { Pin } from './pin.ts';
import { Rest } from './rest.ts';
import { Session } from './session.ts';
import { Shop } from './shop.ts';
import { SignInCode } from './sign-in-code.ts';

/** Every model; a new one is added here, in the order of the alphabet. */
const models = [
  AuditRecord,
  Case,
  Customer,
  Entry,
  Estimate,
  Instrument,
  Outbox,
  Party,
  Person,
  Photo,
  PhotoCopy,
  Pin,
  Rest,
  Session,
  Shop,
  SignInCode,
];

/** Ties every model to `sequelize`. Called once per pool by `database()`. */
export function initModels(sequelize: Sequelize): void {
  for (const model of models) model.register(sequelize);
}
