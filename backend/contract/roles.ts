import * as z from 'zod';

export const roles = ['analyst', 'cfo', 'reader', 'billing_admin'] as const;
export const Role = z.enum(roles);
export type Role = z.infer<typeof Role>;
