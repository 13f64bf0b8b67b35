import { z } from 'zod';

/** The page's policy allows no code made from strings, so zod is told not to try. */
export default defineNuxtPlugin({
  name: 'zod-without-eval',
  enforce: 'pre',
  setup() {
    z.config({ jitless: true });
  },
});
