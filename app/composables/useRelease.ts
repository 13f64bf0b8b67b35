import type { ServerAnswer } from '~/utils/download';

/** Where a download stands. */
export type Release =
  | { readonly state: 'rest' }
  | { readonly state: 'writing' }
  | { readonly state: 'taken'; readonly words: string }
  | { readonly state: 'differs'; readonly here: string; readonly there: string; readonly answer: Extract<ServerAnswer, { readonly kind: 'program' }> }
  | { readonly state: 'stopped'; readonly words: string; readonly messages: readonly string[] };

/**
 * Taking a program away: cautions first, then the server's text against the browser's own. What is saved is the
 * server's, and where the two differ nobody is left to guess.
 */
export function useRelease() {
  const slot = useSlotStore();
  const { announce } = useSaying();
  const release = ref<Release>({ state: 'rest' });
  /** What waits for the cautions to be confirmed. */
  const asking = ref<'download' | 'copy' | null>(null);
  let confirmed = '';

  const cautions = computed(() => (slot.current ? cautionsOf(slot.current.readback) : []));
  /** Why nothing can be taken away, or null. */
  const dead = computed<string | null>(() => {
    const wrong = Object.keys(slot.problems).length;
    if (wrong > 0) return `${countWord(wrong)} ${wrong === 1 ? 'size needs' : 'sizes need'} a change.`;
    if (slot.current) return null;
    if (slot.stopped) return 'The code that reads back could not be fetched. Reload the page when there is a connection: the address keeps the drawing.';
    if (!slot.settled || !slot.made) return 'Reading the program back.';
    const differ = differing(slot.made.readback).length;
    return `${countWord(differ)} ${differ === 1 ? 'reading differs' : 'readings differ'} from the drawing.`;
  });
  watch(() => slot.draft, () => { release.value = { state: 'rest' }; });

  function say(next: Release, words: string): void {
    release.value = next;
    announce(words);
  }
  function save(answer: { readonly fileName: string; readonly program: string; readonly mark: string }): void {
    saveFile(answer.fileName, answer.program);
    const time = new Date().toLocaleTimeString([], { hour: '2-digit', minute: '2-digit' });
    const words = `Saved as ${answer.fileName} at ${time}.`;
    say({ state: 'taken', words }, words);
  }

  async function download(): Promise<void> {
    const mine = slot.current;
    if (!mine || release.value.state === 'writing') return;
    if (cautions.value.length > 0 && confirmed !== mine.mark) {
      asking.value = 'download';
      return;
    }
    say({ state: 'writing' }, 'The server writes the program and reads it back.');
    const answer = await askServer(slot.raw);
    if (mine !== slot.current) return; // The drawing moved on while the server worked: that program is no longer wanted.
    if (answer.kind === 'program') {
      if (answer.mark === mine.mark && answer.program === mine.program) save(answer);
      else say({ state: 'differs', here: mine.mark, there: answer.mark, answer }, 'The server made another program than this page. Nothing is saved yet.');
      return;
    }
    const messages = answer.kind === 'refused' ? answer.messages.map(({ message }) => message) : [];
    say({ state: 'stopped', words: answer.words, messages }, answer.words);
  }

  async function copy(): Promise<void> {
    const mine = slot.current;
    if (!mine) return;
    if (cautions.value.length > 0 && confirmed !== mine.mark) {
      asking.value = 'copy';
      return;
    }
    const words = (await copyText(mine.program)) ? `Copied ${mine.summary.lines} lines, mark ${mine.mark}.` : 'This browser does not let a page copy. Use Download.';
    say({ state: 'taken', words }, words);
  }

  function confirm(): void {
    const wanted = asking.value;
    confirmed = slot.current?.mark ?? '';
    asking.value = null;
    if (wanted === 'download') void download();
    if (wanted === 'copy') void copy();
  }
  return { release, asking, cautions, dead, download, copy, confirm, save };
}
