import { type RevisionStatus } from '#shared/contract/plans';

/** What a page calls the status of a revision. */
export const STATUS_WORDS: Readonly<Record<RevisionStatus, string>> = {
  draft: 'draft',
  'in-review': 'in review',
  effective: 'in force',
  retired: 'retired',
};
