import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

export const roles = ['owner', 'editor', 'viewer'] as const;
export type Role = (typeof roles)[number];

const email = z.email({ error: 'must be an e-mail address' }).max(254);
const password = z
  .string()
  .min(10, { error: 'must have at least 10 characters' })
  .max(200, { error: 'must have at most 200 characters' });
const personName = z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength);

export const signInSchema = strictObject({
  email,
  password: z.string().min(1, { error: 'must not be empty' }).max(200),
});
export const signUpSchema = strictObject({ name: personName, email, password });
export const requestPasswordResetSchema = strictObject({ email });
export const resetPasswordSchema = strictObject({ token: z.string().min(1).max(200), password });

export const userSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  isSiteAdministrator: z.boolean(),
});

export const membershipSchema = z.object({
  groupId: z.string(),
  groupName: z.string(),
  role: z.enum(roles),
  isPersonal: z.boolean(),
  isDemo: z.boolean(),
});

/** Who is signed in and where they may work. */
export const sessionSchema = z.object({ user: userSchema, groups: z.array(membershipSchema) });

export const memberSchema = z.object({
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  joinedAt: z.iso.datetime(),
});
export const memberListSchema = z.object({ members: z.array(memberSchema) });
export const addMemberSchema = strictObject({ email, role: z.enum(roles) });
export const changeRoleSchema = strictObject({ role: z.enum(roles) });

export const createTokenSchema = strictObject({ name: personName });
export const tokenSchema = z.object({
  id: z.string(),
  name: z.string(),
  createdAt: z.iso.datetime(),
  lastUsedAt: z.iso.datetime().nullable(),
});
/** The token itself is in this answer and nowhere else. */
export const createdTokenSchema = tokenSchema.extend({ token: z.string() });
export const tokenListSchema = z.object({ tokens: z.array(tokenSchema) });

/** Mail caught by the local mail server of development, newest first. */
export const caughtMailListSchema = z.object({
  mails: z.array(
    z.object({
      id: z.string(),
      to: z.string(),
      subject: z.string(),
      text: z.string(),
      receivedAt: z.iso.datetime(),
    }),
  ),
});

export type SignIn = z.infer<typeof signInSchema>;
export type SignUp = z.infer<typeof signUpSchema>;
export type Session = z.infer<typeof sessionSchema>;
export type Membership = z.infer<typeof membershipSchema>;
export type Member = z.infer<typeof memberSchema>;
export type ApiToken = z.infer<typeof tokenSchema>;
export type CreatedApiToken = z.infer<typeof createdTokenSchema>;
