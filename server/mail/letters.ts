/** A mail as it is queued. */
export interface Letter {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

/** Words that people typed, as they may stand in HTML. */
export const escape = (text: string) => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);

/** A letter from its paragraphs; the link stands on a line of its own in both forms. */
function letter(subject: string, before: readonly string[], link: string | null, after: readonly string[]): Letter {
  const paragraphs = (lines: readonly string[]) => lines.map((line) => `<p>${escape(line)}</p>`).join('\n');
  const anchor = link === null ? '' : `\n<p><a href="${escape(link)}">${escape(link)}</a></p>\n`;
  return {
    subject,
    text: `${[...before, ...(link === null ? [] : [link]), ...after].join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><body style="font-family: sans-serif; font-size: 16px; color: #111E2B">\n${paragraphs(before)}${anchor}${paragraphs(after)}\n</body></html>`,
  };
}

/** Every mail about accounts. The words come from us; names that people typed are quoted in them, never more. */
export const letters = {
  confirm: ({ name, shop, link }: { readonly name: string; readonly shop: string; readonly link: string }) => letter(
    'Open your shop on Tallyrail', [`${name}, this link opens ${shop} on Tallyrail.`], link,
    ['It works once, for a day. If you did not ask for it, do nothing: no account is made.'],
  ),
  alreadyHere: ({ name, origin }: { readonly name: string; readonly origin: string }) => letter(
    'You have an account on Tallyrail', [`${name}, somebody asked to open a shop with this address. It has an account already. Sign in, or ask for a new password:`], `${origin}/sign-in`,
    ['If that was not you, do nothing.'],
  ),
  reset: ({ name, link }: { readonly name: string; readonly link: string }) => letter(
    'Set a new password for Tallyrail', [`${name}, this link sets a new password.`], link,
    ['It works once, for an hour. If you did not ask for it, do nothing: your password stays as it is.'],
  ),
  invite: ({ name, shop, from, link }: { readonly name: string; readonly shop: string; readonly from: string; readonly link: string }) => letter(
    `${shop} on Tallyrail`, [`${name}, ${from} asks you to work with ${shop} on Tallyrail, at the bench.`], link,
    ['The link works once, for a week.'],
  ),
  alreadyElsewhere: ({ name, shop }: { readonly name: string; readonly shop: string }) => letter(
    `${shop} on Tallyrail`, [`${name}, ${shop} asks you to work with them on Tallyrail. This address already belongs to an account, and one address works for one shop.`], null,
    ['Give them another address of yours to be invited by.'],
  ),
} as const;
