import type { Sequelize } from 'sequelize';
import { AuditRecord } from './audit-record.ts';
import { Outbox } from './outbox.ts';
import { Person } from './person.ts';
import { Session } from './session.ts';
import { SignInCode } from './sign-in-code.ts';

/** Every model; a new one is added here, in the order of the alphabet. */
const models = [AuditRecord, Outbox, Person, Session, SignInCode];

/** Ties every model to `sequelize`. Called once per pool by `database()`. */
export function initModels(sequelize: Sequelize): void {
  for (const model of models) model.register(sequelize);
}
