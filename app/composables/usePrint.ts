/** What the printer is given: the setup sheet, unless the true-size template was asked for. */
export type Paper = 'sheet' | 'template';

/** Marks the whole page while the template is on its way to the printer (print.css). */
const CLASS = 'print-template';

/**
 * Two papers of one page. The template is drawn only when asked for and says when it stands; then the printer gets it,
 * and afterwards the setup sheet is again what printing gives.
 */
export function usePrint() {
  const paper = useState<Paper>('paper', () => 'sheet');

  function choose(next: Paper): void {
    paper.value = next;
    document.documentElement.classList.toggle(CLASS, next === 'template');
  }
  function printSheet(): void {
    choose('sheet');
    window.print();
  }
  /** The template says when it stands (`printTemplate`); one that stands already is printed at once. */
  function askForTemplate(): void {
    if (paper.value === 'template') void printTemplate();
    choose('template');
  }
  async function printTemplate(): Promise<void> {
    await document.fonts.ready;
    window.addEventListener('afterprint', () => choose('sheet'), { once: true });
    window.print();
  }
  return { paper, printSheet, askForTemplate, printTemplate };
}
