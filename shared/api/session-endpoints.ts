import { z } from 'zod';
import { ROLES } from '../roles';
import { idSchema, nameSchema } from '../quantities';
import { endpoint } from './endpoint';

export const roleSchema = z.enum(ROLES);
/** Fifteen characters or more; common ones are refused by the server. */
export const passwordSchema = z.string().min(15).max(200);
export const emailSchema = z.email().max(200);

export const meSchema = z.strictObject({
  person: z.strictObject({ id: idSchema, name: z.string(), email: z.string() }),
  company: z.strictObject({ id: idSchema, name: z.string() }),
  roles: z.array(roleSchema),
});
export type Me = z.infer<typeof meSchema>;

/** The access token lives ten minutes, in memory; the refresh token travels in an HttpOnly cookie and is never in a body. */
export const sessionSchema = z.strictObject({ accessToken: z.string(), expiresAt: z.iso.datetime(), me: meSchema });
export type Session = z.infer<typeof sessionSchema>;

export const sessionEndpoints = {
  signUp: endpoint({
    method: 'POST',
    path: '/api/sign-up',
    summary: 'Sign a company up; whoever does has all four roles.',
    access: 'public',
    status: 201,
    params: null,
    query: null,
    body: z.strictObject({ company: nameSchema, name: nameSchema, email: emailSchema, password: passwordSchema }),
    response: sessionSchema,
  }),
  signIn: endpoint({
    method: 'POST',
    path: '/api/sign-in',
    summary: 'Sign in; a wrong password and an unknown address are answered alike.',
    access: 'public',
    status: 200,
    params: null,
    query: null,
    body: z.strictObject({ email: z.string().min(1).max(200), password: z.string().min(1).max(200) }),
    response: sessionSchema,
  }),
  refresh: endpoint({
    method: 'POST',
    path: '/api/refresh',
    summary: 'A new access token for the refresh cookie, which is rotated.',
    access: 'public',
    status: 200,
    params: null,
    query: null,
    body: z.strictObject({}),
    response: sessionSchema,
  }),
  signOut: endpoint({
    method: 'POST',
    path: '/api/sign-out',
    summary: 'End this sign-in.',
    access: 'public',
    status: 204,
    params: null,
    query: null,
    body: z.strictObject({}),
    response: null,
  }),
  me: endpoint({
    method: 'GET',
    path: '/api/me',
    summary: 'Who is signed in, to which company, in which roles.',
    access: 'signed-in',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: meSchema,
  }),
  crew: endpoint({
    method: 'GET',
    path: '/api/crew',
    summary: 'The people of the company.',
    access: 'signed-in',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.strictObject({
      people: z.array(z.strictObject({ id: idSchema, name: z.string(), email: z.string(), roles: z.array(roleSchema) })),
    }),
  }),
  changeRoles: endpoint({
    method: 'PATCH',
    path: '/api/crew/:personId',
    summary: 'Change what a person is in the company; the last owner stays owner.',
    access: { may: 'people.manage' },
    status: 200,
    params: z.strictObject({ personId: idSchema }),
    query: null,
    body: z.strictObject({ roles: z.array(roleSchema).min(1) }),
    response: z.strictObject({ id: idSchema, name: z.string(), email: z.string(), roles: z.array(roleSchema) }),
  }),
};
