import type { Migration } from '../migration.ts';
import { shopPeopleSessions } from './0001-shop-people-sessions.ts';
import { instrumentsCases } from './0002-instruments-cases.ts';
import { witnessLog } from './0003-witness-log.ts';
import { timelinePhotos } from './0004-timeline-photos.ts';
import { warrantiesOutbox } from './0005-warranties-outbox.ts';
import { rateCounts } from './0006-rate-counts.ts';
import { noteBytes } from './0007-note-bytes.ts';

/** Every migration, oldest first. A migration that has landed is never edited; a later one is added. */
export const migrations: Migration[] = [
  shopPeopleSessions,
  instrumentsCases,
  witnessLog,
  timelinePhotos,
  warrantiesOutbox,
  rateCounts,
  noteBytes,
];
