import { z } from 'zod';

// The page's policy allows no code made from strings, so zod is told not to try: before any schema is made.
z.config({ jitless: true });
