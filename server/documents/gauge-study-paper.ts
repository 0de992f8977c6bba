import { type GaugeStudy, type StudyResults } from '#shared/contract/gauge-studies';

/** What a gauge study's paper is made of. */
export interface GaugeStudyPaper {
  study: GaugeStudy;
  results: StudyResults;
  issuer: { name: string; department: string; address: string };
  printedAt: string;
}
