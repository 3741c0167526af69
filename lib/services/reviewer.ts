// server only
import type { ReviewLinkRow } from '@/db/queries/reviews';
import type { Author } from './in-transaction';

/** The holder of a review link as the author of entries; a reviewer has no account. */
export function reviewer(link: ReviewLinkRow): Author {
  return { officeId: link.office_id, name: link.reviewer };
}
