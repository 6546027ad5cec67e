import { z } from 'zod';

/**
 * At least 12 characters and not one of a kind; no rules of composition, which only make passwords
 * worse (NIST SP 800-63B, 5.1.1.2).
 */
export const newPassword = z
  .string()
  .min(12, 'Take at least 12 characters; several words are easiest to remember.')
  .max(200, 'Take at most 200 characters.')
  .refine((text) => new Set(text).size >= 5, 'Take a password with more different characters.');

export const changePasswordBody = z.strictObject({ currentPassword: z.string().max(1000), newPassword });
export const askResetBody = z.strictObject({
  email: z.email('Write an e-mail address, such as name@laboratory.example.'),
});
export const resetPasswordBody = z.strictObject({ newPassword });

export const roles = ['chemist', 'analyst', 'pi'] as const;
export const role = z.enum(roles);

export const createUserBody = z.strictObject({
  email: z.email('Write an e-mail address, such as name@laboratory.example.').max(254).toLowerCase(),
  name: z.string().trim().min(1, 'Write the name that signatures will show.').max(120),
  isAdmin: z.boolean().default(false),
  memberships: z
    .array(z.strictObject({ group: z.uuid(), role }))
    .max(30)
    .default([]),
});

export const changeUserBody = z.strictObject({
  name: z.string().trim().min(1).max(120).optional(),
  isAdmin: z.boolean().optional(),
  disabled: z.boolean().optional(),
  memberships: z
    .array(z.strictObject({ group: z.uuid(), role }))
    .max(30)
    .optional(),
  reason: z.string().trim().min(3, 'Say in a few words why.').max(1000),
});

export const createGroupBody = z.strictObject({ name: z.string().trim().min(2).max(120) });

export const userSchema = z.object({
  id: z.string(),
  email: z.string(),
  name: z.string(),
  isAdmin: z.boolean(),
  mustChangePassword: z.boolean(),
  disabledAt: z.string().nullable(),
  memberships: z.array(z.object({ group: z.string(), groupName: z.string(), role })),
  version: z.number(),
});
export type PresentedUser = z.infer<typeof userSchema>;

export const groupSchema = z.object({ id: z.string(), name: z.string(), version: z.number() });
