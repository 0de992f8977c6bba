import { CERTIFICATE_STATUSES } from '#shared/contract/certificates';
import { type CertificateData } from '#shared/papers/certificate-data';
import { blob, check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, oneOf } from './columns';
import { lots } from './lots';
import { people } from './people';

/** An issued certificate; triggers refuse to alter or remove it. */
export const certificates = sqliteTable('certificates', {
  id: integer().primaryKey({ autoIncrement: true }),
  number: text().notNull().unique(),
  lotId: integer()
    .notNull()
    .references(() => lots.id),
  data: text({ mode: 'json' }).$type<CertificateData>().notNull(),
  dataDigest: text().notNull(),
  unitsReleased: integer().notNull(),
  issuedAt: moment().notNull(),
  issuedById: integer()
    .notNull()
    .references(() => people.id),
});

/** The file of a certificate, made after the deciding transaction; triggers refuse to alter or remove it. */
export const certificateFiles = sqliteTable('certificate_files', {
  certificateId: integer()
    .primaryKey()
    .references(() => certificates.id),
  sha256: text().notNull(),
  bytes: blob({ mode: 'buffer' }).notNull(),
  madeAt: moment().notNull(),
});

/** The life of a certificate; the newest line is its status. Append-only by trigger. */
export const certificateStatuses = sqliteTable(
  'certificate_statuses',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    certificateId: integer()
      .notNull()
      .references(() => certificates.id),
    status: text({ enum: CERTIFICATE_STATUSES }).notNull(),
    at: moment().notNull(),
    reason: text(),
  },
  (table) => [
    check('certificate_statuses_status', oneOf(table.status, CERTIFICATE_STATUSES)),
    index('certificate_statuses_certificate').on(table.certificateId),
  ],
);
