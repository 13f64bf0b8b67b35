import type { Work } from '#shared/commission/work';
import { workOutPiece } from './workOut';

/** Works pieces out off the page's thread, one order after another; each answer carries its order's number. */
self.onmessage = ({ data: { number, work } }: MessageEvent<{ readonly number: number; readonly work: Work }>) => self.postMessage({ number, worked: workOutPiece(work) });
