import { z } from 'zod';
import { tryLimitsQuery, type TryLimitsQuery } from '#shared/contracts/limits.ts';
import { machineKind } from '#shared/contracts/machine.ts';

/** The form before it is a question: the whole site is an empty choice. */
export const trialForm = z
  .object({
    machineKind: z.union([machineKind, z.literal('')]),
    /** As the site, or as the method proposes. */
    follow: z.boolean(),
    // Judged by the contract below, so that its words are the server's.
    suspectedScore: z.unknown(),
    likelyScore: z.unknown(),
  })
  .superRefine((form, context) => {
    if (form.follow) return;
    for (const path of ['suspectedScore', 'likelyScore'] as const) {
      if (typeof form[path] === 'number') continue;
      context.addIssue({ code: 'custom', path: [path], message: 'Enter a number.' });
    }
    const judged = tryLimitsQuery.safeParse(trialQueryOf(form));
    for (const { path, message } of judged.error?.issues ?? []) {
      context.addIssue({ code: 'custom', path, message });
    }
  });
export type TrialForm = z.input<typeof trialForm>;

/** What is asked of the server. */
export function trialQueryOf(form: TrialForm): Partial<Record<keyof TryLimitsQuery, unknown>> {
  const { machineKind: kind, follow, suspectedScore, likelyScore } = form;
  return {
    ...(kind === '' ? {} : { machineKind: kind }),
    ...(follow ? {} : { suspectedScore, likelyScore }),
  };
}
