import * as z from 'zod';

/** What a member may do in a household: owner everything, designer photos and scenes, tuner walls and bench, viewer look and play. */
export const Role = z.enum(['owner', 'designer', 'tuner', 'viewer']);
export type Role = z.infer<typeof Role>;

export const everyRole: readonly Role[] = Role.options;
export const ownerOnly: readonly Role[] = ['owner'];
export const designers: readonly Role[] = ['owner', 'designer'];
export const tuners: readonly Role[] = ['owner', 'tuner'];
