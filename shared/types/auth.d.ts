import type {} from '#auth-utils';

declare module '#auth-utils' {
  /** Who is signed in. Accounts come with the shop's records: until then nobody is, and nothing is known of them. */
  interface User {
    readonly id?: never;
  }
}

export {};
