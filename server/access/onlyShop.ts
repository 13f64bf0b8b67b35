import { useDatabase } from '../db/shop';
import { shops } from '../db/schema';
import { problem } from '../utils/problem';

/** The whole database is one shop's to take away or to put back only where no other shop's rows lie in it. */
export async function expectOnlyShop(): Promise<void> {
  const two = await useDatabase().select({ id: shops.id }).from(shops).limit(2);
  if (two.length > 1) throw problem(403, 'Several shops share this installation, so its database is not yours to copy or replace. Take the export, or ask whoever runs it for a backup by command.');
}
