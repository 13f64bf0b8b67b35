import type { CutReport, CutOrder } from './startWork';
import { type WorkedOut, workOut } from './workOut';

/** Works out one program's picture off the page's thread; whoever wants another ends this worker. */
self.onmessage = ({ data: { segments, sizes } }: MessageEvent<CutOrder>) => {
  const post = (report: CutReport, handed: Transferable[] = []) => self.postMessage(report, { transfer: handed });
  const work = workOut(segments, sizes);
  let said = 0;
  for (let next = work.next(); ; next = work.next()) {
    if (next.done) return post({ kind: 'done', worked: next.value }, buffersOf(next.value));
    if (next.value - said < 0.01) continue; // it is shown in hundredths
    said = next.value;
    post({ kind: 'share', share: said });
  }
};

/** Handed over, not copied. */
function buffersOf({ lines, field }: WorkedOut): Transferable[] {
  const arrays = [lines.from, lines.to, lines.travel, lines.kind, ...(field ? [field.position, field.index, field.falls.data] : [])];
  return arrays.flatMap(({ buffer }) => (buffer instanceof ArrayBuffer ? [buffer] : []));
}
