import { z } from 'zod';
import { id, isoDate, paragraph } from './fields.ts';
import { inspectionListItem, inspectionState } from './inspection.ts';

/** An inspection on the board, with what changing it needs. */
export const deskItem = inspectionListItem.extend({
  assigneeUserId: z.int(),
  version: z.int(),
});
export type DeskItem = z.infer<typeof deskItem>;

/** One column of the board: all that are in work, the newest of what is done with. */
export const deskColumn = z.object({
  state: inspectionState,
  total: z.int(),
  items: z.array(deskItem),
});
export type DeskColumn = z.infer<typeof deskColumn>;

/** What an asset owner has on hand: inspections assigned or accepted. */
export const ownerLoad = z.object({
  userId: z.int(),
  name: z.string(),
  machineCount: z.int(),
  openCount: z.int(),
  overdueCount: z.int(),
});
export type OwnerLoad = z.infer<typeof ownerLoad>;

export const deskResponse = z.object({
  columns: z.array(deskColumn),
  owners: z.array(ownerLoad),
  /** Machines for which nobody would be asked to inspect; a few of them by name. */
  machinesWithoutOwner: z.object({
    total: z.int(),
    machines: z.array(z.object({ id: z.int(), tag: z.string(), name: z.string() })),
  }),
  /** The calendar day that is still today somewhere; a due date may not lie before it. */
  today: isoDate,
});
export type DeskResponse = z.infer<typeof deskResponse>;

/** Hands the task to another asset owner, who accepts it anew; the due date may move with it. */
export const reassignInspectionRequest = z.strictObject({
  version: z.int().min(1),
  assigneeUserId: id,
  dueOn: isoDate,
  reason: paragraph(2000).default(''),
});
export type ReassignInspectionRequest = z.infer<typeof reassignInspectionRequest>;

export const changeDueDateRequest = z.strictObject({
  version: z.int().min(1),
  dueOn: isoDate,
  reason: paragraph(2000).default(''),
});
export type ChangeDueDateRequest = z.infer<typeof changeDueDateRequest>;
