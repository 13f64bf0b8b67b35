import { LEAVING } from './leaving';

/** Whose day this browser keeps: their id, so that every page can tell without opening the store. */
const KEPT_FOR = 'tallyrail.bench';
/** What was ticked and measured so far of a rail begins with this. */
export const PROGRESS = 'tallyrail.bench.';

const read = (name: string): string | null => {
  try {
    return localStorage.getItem(name);
  } catch {
    return null; // storage is shut: nothing is kept either
  }
};
const set = (name: string, value: string | null): void => {
  try {
    if (value === null) localStorage.removeItem(name);
    else localStorage.setItem(name, value);
  } catch {
    // as above
  }
};

export const noteKeptFor = (personId: string | null): void => set(KEPT_FOR, personId);
export const noteLeaving = (leaving: boolean): void => set(LEAVING, leaving ? 'yes' : null);

/** Forgets the kept day: at sign-out, and where somebody else signs in. Logged cuts stay until their own person is back. */
export async function forgetDay(): Promise<void> {
  const { openStore } = await import('~/bench/store');
  await openStore().forgetDay();
  for (const name of Object.keys(sessionStorage)) if (name.startsWith(PROGRESS)) sessionStorage.removeItem(name);
  noteKeptFor(null);
}

/** Forgets the kept day unless it is this person's; null: nobody is signed in. */
export async function forgetOthers(personId: string | null): Promise<void> {
  const keptFor = read(KEPT_FOR);
  if (keptFor !== null && keptFor !== personId) await forgetDay();
}
