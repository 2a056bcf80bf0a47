import { z } from 'zod';

const name = z.string().trim().min(1, 'Say a name.').max(120, 'A name has at most 120 characters.');
const email = z
  .email('Write an address such as name@example.org.')
  .max(254, 'An address has at most 254 characters.');
const newPassword = z
  .string()
  .min(10, 'A password has at least 10 characters; a short sentence works well.')
  .max(200, 'A password has at most 200 characters.');
const anyPassword = z
  .string()
  .min(1, 'Type your password.')
  .max(200, 'A password has at most 200 characters.');

export const signInSchema = z.object({ email, password: anyPassword });
export const registerSchema = z.object({ name, email, password: newPassword });
export const forgottenSchema = z.object({ email });
export const resetSchema = z.object({ password: newPassword });
export const invitationSchema = z.object({ name, password: newPassword });
export const nameSchema = z.object({ name });
export const changePasswordSchema = z.object({ currentPassword: anyPassword, newPassword });
export const walkInSchema = z.object({ name, email });

export type WalkIn = z.infer<typeof walkInSchema>;
