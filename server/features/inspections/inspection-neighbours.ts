import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Db } from '#server/db/database.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import type { PersonalMail } from '#server/mail/mailer.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import type { SiteRole } from '#shared/contracts/session.ts';

/** How an inspection moves its finding. */
export type InspectionEvent =
  | 'assign'
  | 'inspection-repaired'
  | 'inspection-not-loose'
  | 'inspection-unsettled'
  | 'inspection-cancelled';

/** What inspections take from the other features and from the mail. */
export interface InspectionNeighbours {
  /** The finding with the screenings that show it; refuses where the site has none such. */
  findingBackground: (
    siteId: number,
    findingId: number,
  ) => Promise<{ finding: Finding; screenings: Screening[]; clearest: Screening | null }>;
  moveFinding: (
    db: Db,
    step: {
      principal: SitePrincipal;
      findingId: number;
      event: InspectionEvent;
      reason: string;
      version?: number;
    },
    now: Date,
  ) => Promise<void>;
  assessSeats: (
    positionId: number,
    screenings: readonly Screening[],
  ) => Promise<SeatAssessmentsResponse>;
  membersOf: (
    siteId: number,
  ) => Promise<{ userId: number; name: string; email: string; role: SiteRole }[]>;
  /** False where the reader has switched off mails of this kind. */
  addMail: (db: Db, mail: PersonalMail, now: Date) => Promise<boolean>;
  publicUrl: () => string;
}
