import type { Role } from '#shared/types/people';

/** What every page knows of its reader and of this installation. */
export interface Account {
  readonly person: { readonly id: string; readonly name: string; readonly email: string; readonly role: Role; readonly shop: string } | null;
  readonly demo: boolean;
  /** The demo's mails can be read here. */
  readonly demoMail: boolean;
  readonly sendsMail: boolean;
}

/** Who is signed in: asked once for a page, and again after whatever changes it. */
export function useAccount() {
  const account = useState<Account | null>('account', () => null);
  const request = useRequestFetch();
  async function refresh(): Promise<Account> {
    account.value = await request<Account>('/api/account');
    if (import.meta.client) await forgetOthers(account.value.person?.id ?? null);
    return account.value;
  }
  return { account, refresh };
}
