import * as z from 'zod';

/** Runs before anything else in the browser. The content policy forbids making code from text, which zod would try. */
z.config({ jitless: true });
