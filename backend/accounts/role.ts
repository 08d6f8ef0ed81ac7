/** What a member of a workspace may be. */
export type Role = 'analyst' | 'cfo' | 'reader' | 'billing_admin';
