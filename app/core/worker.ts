import { answer } from './answer';
import { type Order, type Parcel, sendReading } from './parcels';

/** The core off the page's thread: one order at a time, in the order they come. */
self.onmessage = ({ data: { number, raw } }: MessageEvent<Order>) => {
  const post = (parcel: Parcel, handed: Transferable[] = []) => self.postMessage(parcel, { transfer: handed });
  for (const said of answer(raw)) {
    if (said.kind === 'judged') post({ number, kind: 'judged', issues: said.issues });
    else if (said.kind === 'made') sendReading(number, said, post);
  }
};
