import { z } from 'zod';
import { roles } from '../rules/authorization.ts';
import { emailSchema, idSchema, nameSchema } from './common.ts';
import { endpoint } from './endpoint.ts';

/** Length over composition (NIST SP 800-63B §5.1.1.2, from memory): at least 10 characters, no other rule. */
export const passwordSchema = z.string().min(10, 'must have at least 10 characters').max(200, 'must have at most 200 characters');
export const unitsSchema = z.enum(['us', 'metric']);
export type Units = z.infer<typeof unitsSchema>;
export const languageSchema = z.enum(['en', 'es']);
const tokenSchema = z.string().min(20).max(200);

export const meSchema = z.object({
  id: idSchema,
  email: z.string(),
  name: z.string(),
  units: unitsSchema,
  language: languageSchema,
  emailConfirmed: z.boolean(),
  farms: z.array(z.object({ id: idSchema, name: z.string(), role: z.enum(roles), timeZone: z.string() })),
  demo: z.boolean(),
});
export type Me = z.infer<typeof meSchema>;

export const signUpBody = z.object({ name: nameSchema, email: emailSchema, password: passwordSchema, units: unitsSchema.default('us'), language: languageSchema.default('en') });
export const signInBody = z.object({ email: emailSchema, password: z.string().min(1, 'must not be empty').max(200) });
export const profileBody = z.object({ name: nameSchema, units: unitsSchema, language: languageSchema });
export const changePasswordBody = z.object({ currentPassword: z.string().min(1, 'must not be empty').max(200), newPassword: passwordSchema });
export const resetBody = z.object({ token: tokenSchema, password: passwordSchema });
const mailBody = z.object({ email: emailSchema });

export const accountEndpoints = {
  signUp: endpoint({ id: 'signUp', method: 'post', path: '/api/account/sign-up', summary: 'Open an account; a letter to confirm the address follows.', access: 'public', rateLimit: 'mail', body: signUpBody, status: 202 }),
  confirmEmail: endpoint({ id: 'confirmEmail', method: 'post', path: '/api/account/confirm', summary: 'Confirm an address by the token of the letter.', access: 'public', rateLimit: 'signIn', body: z.object({ token: tokenSchema }) }),
  resendConfirmation: endpoint({ id: 'resendConfirmation', method: 'post', path: '/api/account/confirm-request', summary: 'Send the letter to confirm my address again; earlier ones are good no more.', access: 'signedIn', rateLimit: 'mail', status: 202 }),
  signIn: endpoint({ id: 'signIn', method: 'post', path: '/api/account/sign-in', summary: 'Sign in; sets the session cookie.', access: 'public', rateLimit: 'signIn', body: signInBody, answer: meSchema }),
  signOut: endpoint({ id: 'signOut', method: 'post', path: '/api/account/sign-out', summary: 'Sign out of this session.', access: 'signedIn' }),
  me: endpoint({ id: 'me', method: 'get', path: '/api/account', summary: 'Who is signed in, and at which farms.', access: 'signedIn', answer: meSchema }),
  updateMe: endpoint({ id: 'updateMe', method: 'put', path: '/api/account', summary: 'Change name, units and language.', access: 'signedIn', body: profileBody, answer: meSchema }),
  changePassword: endpoint({ id: 'changePassword', method: 'post', path: '/api/account/password', summary: 'Change the password and sign out everywhere else.', access: 'signedIn', rateLimit: 'signIn', body: changePasswordBody }),
  requestReset: endpoint({ id: 'requestReset', method: 'post', path: '/api/account/reset-request', summary: 'Ask for a letter to set a new password; the answer is the same whether or not the address is known.', access: 'public', rateLimit: 'mail', body: mailBody, status: 202 }),
  resetPassword: endpoint({ id: 'resetPassword', method: 'post', path: '/api/account/reset', summary: 'Set a new password by the token of the letter; signs out everywhere.', access: 'public', rateLimit: 'signIn', body: resetBody }),
  acceptInvitation: endpoint({ id: 'acceptInvitation', method: 'post', path: '/api/account/invitations/accept', summary: 'Join a farm by the token of an invitation.', access: 'signedIn', body: z.object({ token: tokenSchema }), answer: meSchema }),
};
