import { type Course, type CourseOrder, courseOf } from './course';

/** A longer program than this is read in a worker, bytes: below it reading stays well under 50 ms. */
const SHORT = 30_000;

/** A program's course: a long one is read off the page's thread, so that nothing at the bench ever sticks. */
export function readCourse(order: CourseOrder): Promise<Course | null> {
  if (order.text.length < SHORT || typeof Worker === 'undefined') return Promise.resolve(courseOf(order));
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./watchWorker.ts', import.meta.url), { type: 'module' });
    const end = (act: () => void) => {
      worker.terminate();
      act();
    };
    worker.onmessage = ({ data }: MessageEvent<Course | null>) => end(() => resolve(data));
    worker.onerror = ({ message }) => end(() => reject(new Error(message || 'The worker that reads the program could not start.')));
    worker.postMessage(order);
  });
}
