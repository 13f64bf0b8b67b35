import type { Raw } from './rawRequest';

/** What the server answered, as far as the page uses it. */
export type ServerAnswer =
  | { readonly kind: 'program'; readonly program: string; readonly fileName: string; readonly mark: string }
  | { readonly kind: 'refused'; readonly messages: readonly { readonly path: string; readonly message: string }[]; readonly words: string }
  | { readonly kind: 'later'; readonly words: string };

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;
const text = (value: unknown): string => (typeof value === 'string' ? value : '');

/** Asks the server for the program of a request. Whatever happens is an answer in words; nothing drawn is lost. */
export async function askServer(raw: { readonly [key: string]: Raw }): Promise<ServerAnswer> {
  let response: Response;
  try {
    response = await fetch('/api/programs', {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'accept': 'application/json' },
      body: JSON.stringify(raw),
    });
  } catch {
    return { kind: 'later', words: 'The server cannot be reached. Nothing is lost: download again when there is a connection.' };
  }
  const body: unknown = await response.json().catch(() => null);
  const answer = isRecord(body) ? body : {};
  if (response.ok) {
    const [program, fileName, mark] = [text(answer.program), text(answer.fileName), text(answer.mark)];
    if (program && fileName && mark) return { kind: 'program', program, fileName, mark };
    return { kind: 'later', words: 'The answer came without a program. Nothing is lost: download again.' };
  }
  if (response.status === 429) {
    const wait = Number(response.headers.get('retry-after'));
    return { kind: 'later', words: `That is more programs than the server makes for one address at a time. Wait ${wait > 0 ? `${wait} s` : 'a minute'} and download again.` };
  }
  const errors = Array.isArray(answer.errors) ? answer.errors.filter(isRecord) : [];
  const messages = errors.map((error) => ({ path: text(error.path), message: text(error.message) }));
  if (response.status === 422) return { kind: 'refused', messages, words: 'The server does not take these sizes.' };
  return { kind: 'later', words: `${text(answer.detail) || `The server stopped with ${response.status}.`} Nothing is lost: download again.` };
}

/** Hands a text to the browser as a file. */
export function saveFile(name: string, content: string): void {
  const url = URL.createObjectURL(new Blob([content], { type: 'text/plain;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser reads the file after the click returns.
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

/** Copies a text; over plain HTTP there is no clipboard, and the old way through a selection still works. */
export async function copyText(content: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(content);
    return true;
  } catch {
    const area = document.createElement('textarea');
    area.value = content;
    area.setAttribute('readonly', '');
    area.style.position = 'fixed';
    area.style.opacity = '0';
    document.body.append(area);
    area.select();
    const done = document.execCommand('copy');
    area.remove();
    return done;
  }
}
