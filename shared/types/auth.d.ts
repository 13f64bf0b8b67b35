import type {} from '#auth-utils';

declare module '#auth-utils' {
  /** Who a session is for; everything else about them is looked up, so that nothing sealed can be out of date. */
  interface User {
    readonly id: string;
    /** The epoch of the person's sessions when this one began. */
    readonly epoch: number;
  }
}

export {};
