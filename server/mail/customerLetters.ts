import { PROGRESS_WORDS, type ProgressMail } from '#shared/commission/stagesMail';
import { LINK_RULES } from '#shared/quote/access';
import { type Letter, escape } from './letters';

/** Whose letter it is, and of which commission. */
export interface About {
  readonly shop: string;
  /** The customer as the shop calls them. */
  readonly to: string;
  readonly commission: string;
}

/** One paragraph: words, a code by itself, or a link by itself with the words it stands under in HTML. */
type Part = string | { readonly link: string; readonly words: string } | { readonly code: string };

// eslint-disable-next-line no-control-regex -- names that people typed may not end a header line or turn the text around
const UNSEEN = /[\u0000-\u001f\u007f-\u009f\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]+/g;
const LONGEST_SUBJECT = 120; // characters that a list of mails shows at most

/** What people typed, as it may stand in a line. */
const oneLine = (text: string) => text.replace(UNSEEN, ' ').replace(/ {2,}/g, ' ').trim();

function asText(part: Part): string {
  if (typeof part === 'string') return oneLine(part);
  return 'link' in part ? part.link : part.code;
}

function asHtml(part: Part): string {
  if (typeof part === 'string') return `<p>${escape(oneLine(part))}</p>`;
  if ('code' in part) return `<p style="font-family: monospace; font-size: 28px; letter-spacing: 4px">${escape(part.code)}</p>`;
  return `<p><a href="${escape(part.link)}">${escape(part.words)}</a><br><span style="font-size: 13px">${escape(part.link)}</span></p>`;
}

/** A letter in the shop's name: it greets, says one thing, and is signed. No picture and no script is in it, and nothing is counted by opening it. */
function letter({ shop, to, commission }: About, subject: string, parts: readonly Part[]): Letter {
  const all: Part[] = [`${to},`, ...parts, `${shop}`, `You get this because ${shop} works on "${commission}" for you. Answer this mail to reach the shop.`];
  const title = oneLine(subject);
  return {
    subject: title.length > LONGEST_SUBJECT ? `${title.slice(0, LONGEST_SUBJECT - 1).trimEnd()}…` : title,
    text: `${all.map(asText).join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><body style="font-family: sans-serif; font-size: 16px; color: #111E2B">\n${all.map(asHtml).join('\n')}\n</body></html>`,
  };
}

/** What a reminder is about: amounts and days are as the shop writes them. */
export type ReminderOf =
  | { readonly what: 'approval'; readonly number: string; readonly until: string }
  | { readonly what: 'deposit' | 'balance'; readonly amount: string };

function reminderWords(of: ReminderOf): { readonly subject: string; readonly line: string; readonly link: string } {
  switch (of.what) {
    case 'approval': return { subject: `Quote ${of.number} is open until ${of.until}`, line: `Quote ${of.number} waits for your approval. It is open until ${of.until}; after that we make a new one.`, link: 'Look at the quote' };
    case 'deposit': return { subject: 'Your deposit', line: `The deposit of ${of.amount} is still open. We buy the wood once it is paid.`, link: 'Pay the deposit' };
    case 'balance': return { subject: 'What is still open', line: `${of.amount} is still open.`, link: 'Pay what is open' };
  }
}

const minutes = LINK_RULES.codeLifetime / 60_000;

/** Every mail to a customer. The words come from us; what people typed is quoted in them, never more. */
export const customerLetters = {
  quoteReady: (about: About, { number, revision, total, until, link }: { readonly number: string; readonly revision: number; readonly total: string; readonly until: string; readonly link: string }) => letter(
    about, `${revision > 1 ? 'Changed quote' : 'Quote'} ${number} from ${about.shop}`,
    [
      `${revision > 1 ? `Here is quote ${number} as it is now (revision ${revision})` : `Here is quote ${number}`} for "${about.commission}": ${total}, open until ${until}.`,
      'Its page shows your piece to scale with your coins on it, the price and the terms. There you approve it or ask for a change.',
      { link, words: 'Look at the piece and its price' },
      'The link is yours: whoever has it sees piece and price. To approve or pay we also ask for a code that is mailed to this address.',
    ],
  ),
  code: (about: About, { code }: { readonly code: string }) => letter(
    about, `Your code from ${about.shop}`,
    ['This is the code that was asked for:', { code }, `It works once, for ${minutes} minutes. Nobody from the shop will ask you for it. If you did not ask for it, do nothing.`],
  ),
  paymentReceived: (about: About, { amount, method, open, link }: { readonly amount: string; readonly method: 'card' | 'cash' | 'transfer'; readonly open: string | null; readonly link: string }) => letter(
    about, `${about.shop} has received ${amount}`,
    [
      `Thank you. We have received ${amount} ${method === 'cash' ? 'in cash' : `by ${method}`}.`,
      open === null ? 'Everything is paid.' : `${open} is still to be paid; we will ask for it when it is due.`,
      { link, words: 'See your payments and the receipt' },
    ],
  ),
  progress: (about: About, { stage, due, link }: { readonly stage: ProgressMail; readonly due: string; readonly link: string }) => letter(
    about, oneLine(`${about.commission}: ${PROGRESS_WORDS[stage]}`).replace(/\.$/, ''),
    [
      PROGRESS_WORDS[stage], ...(stage === 'delivered' ? [] : [`It is due on ${due}.`]),
      { link, words: 'See your piece' }, 'On that page you choose which of these mails you get.',
    ],
  ),
  reminder: (about: About, of: ReminderOf, { link }: { readonly link: string }) => {
    const { subject, line, link: words } = reminderWords(of);
    return letter(about, `${subject} – ${about.commission}`, [line, { link, words }, 'If this has crossed with yours, do nothing.']);
  },
} as const;
