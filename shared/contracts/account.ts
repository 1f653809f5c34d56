import { z } from 'zod';

export const changePasswordRequest = z.strictObject({
  currentPassword: z.string().min(1, 'Enter your present password.').max(256),
  newPassword: z.string().min(12, 'At least 12 characters.').max(256, 'At most 256 characters.'),
});
export type ChangePasswordRequest = z.infer<typeof changePasswordRequest>;
