/** Who may do what (PRODUCT.md): a visitor has no account. */
export const ROLES = ['owner', 'hand', 'customer'] as const;
export type Role = (typeof ROLES)[number];

export const PERSON_STATUSES = ['active', 'suspended', 'removed'] as const;
export type PersonStatus = (typeof PERSON_STATUSES)[number];
