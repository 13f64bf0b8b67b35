import { shopOf } from '#server/services/people';
import { sendsMail } from '#server/utils/siteOf';
import { settings } from '#server/utils/settings';

/** Who is signed in, and what this installation is: what every page needs to know first. */
export default defineEventHandler(async ({ context: { person } }) => {
  const shop = person ? await shopOf(person.shopId) : null;
  return {
    person: person && shop ? { id: person.id, name: person.name, email: person.email, role: person.role, shop: shop.name } : null,
    demo: settings.TALLYRAIL_DEMO,
    demoMail: settings.TALLYRAIL_DEMO && person?.role === 'owner' && shop?.demo === true,
    sendsMail,
  };
});
