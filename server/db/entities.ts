import { Activity } from './entities/activity.entity.ts';
import { BearingPosition } from './entities/bearing-position.entity.ts';
import { CalendarFeed } from './entities/calendar-feed.entity.ts';
import { DemoMail } from './entities/demo-mail.entity.ts';
import { FindingScreening } from './entities/finding-screening.entity.ts';
import { Finding } from './entities/finding.entity.ts';
import { FitRecord } from './entities/fit-record.entity.ts';
import { InspectionPhoto } from './entities/inspection-photo.entity.ts';
import { Inspection } from './entities/inspection.entity.ts';
import { LimitsChange } from './entities/limits-change.entity.ts';
import { Machine } from './entities/machine.entity.ts';
import { MailOptOut } from './entities/mail-opt-out.entity.ts';
import { MeasuringPoint } from './entities/measuring-point.entity.ts';
import { Membership } from './entities/membership.entity.ts';
import { OutboxMail } from './entities/outbox-mail.entity.ts';
import { RefreshToken } from './entities/refresh-token.entity.ts';
import { RegisterImportRow } from './entities/register-import-row.entity.ts';
import { RegisterImport } from './entities/register-import.entity.ts';
import { RejectedFile } from './entities/rejected-file.entity.ts';
import { RoutePoint } from './entities/route-point.entity.ts';
import { Route } from './entities/route.entity.ts';
import { Screening } from './entities/screening.entity.ts';
import { Site } from './entities/site.entity.ts';
import { StateChange } from './entities/state-change.entity.ts';
import { Survey } from './entities/survey.entity.ts';
import { User } from './entities/user.entity.ts';
import { Waveform } from './entities/waveform.entity.ts';
import { WebhookDelivery } from './entities/webhook-delivery.entity.ts';
import { Webhook } from './entities/webhook.entity.ts';

/** Every table of the product. */
export const entities = [
  Activity,
  BearingPosition,
  CalendarFeed,
  DemoMail,
  Finding,
  FindingScreening,
  FitRecord,
  Inspection,
  InspectionPhoto,
  LimitsChange,
  Machine,
  MailOptOut,
  MeasuringPoint,
  Membership,
  OutboxMail,
  RefreshToken,
  RegisterImport,
  RegisterImportRow,
  RejectedFile,
  Route,
  RoutePoint,
  Screening,
  Site,
  StateChange,
  Survey,
  User,
  Waveform,
  Webhook,
  WebhookDelivery,
];
