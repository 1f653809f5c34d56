import { CreateAccounts1796083200000 } from './1796083200000-create-accounts.ts';
import { CreateRegister1796083201000 } from './1796083201000-create-register.ts';
import { CreateSurveys1796083202000 } from './1796083202000-create-surveys.ts';
import { CreateFindings1796083203000 } from './1796083203000-create-findings.ts';
import { CreateMail1796083204000 } from './1796083204000-create-mail.ts';
import { CreateRegisterImports1796133109617 } from './1796133109617-create-register-imports.ts';
import { AddSeatDepth1796133730464 } from './1796133730464-add-seat-depth.ts';
import { IndexMachineList1796134294616 } from './1796134294616-index-machine-list.ts';
import { CreateMailOptOuts1796135460755 } from './1796135460755-create-mail-opt-outs.ts';
import { TellMailKinds1796135460756 } from './1796135460756-tell-mail-kinds.ts';
import { LimitMonitoring1796137211959 } from './1796137211959-limit-monitoring.ts';
import { KeepLimits1796137970428 } from './1796137970428-keep-limits.ts';
import { KeepToldLineFrequency1796138768972 } from './1796138768972-keep-told-line-frequency.ts';
import { CreateCalendarFeeds1796138869429 } from './1796138869429-create-calendar-feeds.ts';
import { CreateWebhooks1796138869430 } from './1796138869430-create-webhooks.ts';
import { CreateInspectionPhotos1796143028389 } from './1796143028389-create-inspection-photos.ts';

/** Every migration, oldest first. */
export const migrations = [
  CreateAccounts1796083200000,
  CreateRegister1796083201000,
  CreateSurveys1796083202000,
  CreateFindings1796083203000,
  CreateMail1796083204000,
  CreateRegisterImports1796133109617,
  AddSeatDepth1796133730464,
  IndexMachineList1796134294616,
  CreateMailOptOuts1796135460755,
  TellMailKinds1796135460756,
  LimitMonitoring1796137211959,
  KeepLimits1796137970428,
  KeepToldLineFrequency1796138768972,
  CreateCalendarFeeds1796138869429,
  CreateWebhooks1796138869430,
  CreateInspectionPhotos1796143028389,
];
