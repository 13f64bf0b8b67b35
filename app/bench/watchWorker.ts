import { type CourseOrder, courseOf } from './course';

/** Reads a program's course off the page's thread. */
self.onmessage = ({ data }: MessageEvent<CourseOrder>) => self.postMessage(courseOf(data));
