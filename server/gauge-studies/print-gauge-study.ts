import { type Context } from '#server/context';
import { gaugeStudyPdf } from '#server/documents/gauge-study-pdf';
import { Conflict } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { readGaugeStudy } from './gauge-study-queries';
import { missingReadings } from './keep-gauge-study';

/** A study with its results as PDF. @throws {Conflict} while a reading is missing */
export async function printGaugeStudy(
  { db, clock }: Context,
  id: number,
): Promise<{ bytes: Uint8Array; fileName: string }> {
  const study = readGaugeStudy(db, id);
  const { results, number, needed, entered } = study;
  if (results === null) throw new Conflict('readings-missing', missingReadings(needed - entered));
  const { name, department, address } = findSite(db);
  const printedAt = clock.now().toISOString();
  const bytes = await gaugeStudyPdf({ study, results, issuer: { name, department, address }, printedAt });
  return { bytes, fileName: `${number}.pdf` };
}
